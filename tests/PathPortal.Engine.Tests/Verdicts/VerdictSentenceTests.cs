using PathPortal.Engine.Verdicts;

namespace PathPortal.Engine.Tests.Verdicts;

public sealed class VerdictSentenceTests
{
    [Fact]
    public void Of_JointSpeedFailure_NamesPlaceJointAndUse()
    {
        var outcome = Base(Criterion.JointSpeed, CriterionStatus.Fail, 1.31) with
        {
            Place = new Place(3580, 14.32, 0.6249, 11),
            Joint = 3,
            Value = 2.62,
            LimitValue = 2,
            Unit = "rad/s",
        };

        Assert.Equal(
            "At 62 % of the path (14.320 s, towards waypoint 12) joint 4 needs 131 % of its allowed speed.",
            VerdictSentence.Of(Verdict.Fail, [outcome]));
    }

    [Theory]
    [InlineData(0.05, 0.1, 2, "joint 2 is 2.86° from a position limit, 5.73° are required.")]
    [InlineData(-0.01, 0.1, double.PositiveInfinity, "joint 2 passes its position limit.")]
    [InlineData(12.566370614359172, 6.283185307179586, 2, "joint 2 is 720° from zero, 360° are allowed.")]
    public void Of_JointPosition_SaysWhatIsLeft(double value, double limit, double use, string expected)
    {
        var outcome = Base(Criterion.JointPosition, CriterionStatus.Fail, use) with { Joint = 1, Value = value, LimitValue = limit, Unit = "rad" };

        Assert.EndsWith(expected, VerdictSentence.Of(outcome), StringComparison.Ordinal);
    }

    [Fact]
    public void Of_FailedYesOrNo_IsItsReason() => Assert.Equal(
        "The loop is unstable.",
        VerdictSentence.Of(
            Verdict.Fail,
            [
                Base(Criterion.JointSpeed, CriterionStatus.Fail, 5) with { Value = 10, LimitValue = 2, Unit = "rad/s" },
                Base(Criterion.LoopSound, CriterionStatus.Fail, null) with { Place = null, Reason = "The loop is unstable." },
            ]));

    [Fact]
    public void Of_Pass_NamesTheTightestBindingCriterion()
    {
        var sentence = VerdictSentence.Of(
            Verdict.Pass,
            [
                Base(Criterion.AcrossPath, CriterionStatus.Pass, 0.4) with { Value = 0.0004, LimitValue = 0.001, Unit = "m" },
                Base(Criterion.ToolAxis, CriterionStatus.Near, 0.87) with { Value = 0.0174532925, LimitValue = 0.02, Unit = "rad" },
                Base(Criterion.Singularity, CriterionStatus.Fail, 3) with { Binding = false, Value = 0.01, LimitValue = 0.03, Unit = "1" },
            ]);

        Assert.EndsWith("the tool axis is 1° off its direction, 87 % of what is allowed.", sentence, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(1 + 5e-10, "100 %")]
    [InlineData(0.9999, "100 %")]
    [InlineData(1.000000002, "just over 100 %")]
    [InlineData(1.004, "100.4 %")]
    [InlineData(1.314, "131 %")]
    [InlineData(12, "more than 999 %")]
    [InlineData(double.PositiveInfinity, "more than 999 %")]
    public void Percent_NearTheLimit_NeverReadsAsTheOtherSide(double use, string expected) =>
        Assert.Equal(expected, VerdictSentence.Percent(use));

    [Fact]
    public void Of_Finding_NamesStretchAndPeak()
    {
        var finding = new Finding(
            Criterion.JointAcceleration, true, true, new(10, 0.04, 0.1, 2), new(60, 0.24, 0.2, 2), new(30, 0.12, 0.155, 2), 1.2, 4);

        Assert.Equal(
            "At 15 % of the path (0.120 s, towards waypoint 3) acceleration of joint 5 reaches 120 % of its limit; it is near or over the limit from "
            + "0.040 s to 0.240 s.",
            VerdictSentence.Of(finding));
    }

    private static CriterionOutcome Base(Criterion criterion, CriterionStatus status, double? use) => new()
    {
        Criterion = criterion,
        Status = status,
        Binding = true,
        WorstUse = use,
        Place = new Place(30, 0.12, 0.155, 2),
        NearThreshold = 0.8,
    };
}
