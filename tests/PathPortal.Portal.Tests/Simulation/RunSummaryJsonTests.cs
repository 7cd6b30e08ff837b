using PathPortal.Engine;
using PathPortal.Engine.Verdicts;
using PathPortal.Portal.Simulation;

namespace PathPortal.Portal.Tests.Simulation;

public sealed class RunSummaryJsonTests
{
    [Fact]
    public void Read_OfWritten_GivesTheSameNumbersInfinitiesIncluded()
    {
        var summary = Summary(
            new() { Criterion = Criterion.JointSpeed, Status = CriterionStatus.Fail, Binding = true, WorstUse = double.PositiveInfinity, Place = new(3, 0.012, 1 / 3.0, 1), Joint = 2, NearThreshold = 0.8 },
            new() { Criterion = Criterion.Finished, Status = CriterionStatus.Pass, Binding = true, NearThreshold = 0.8 });

        var text = RunSummaryJson.Write(summary);
        var back = RunSummaryJson.Read(text);

        Assert.Equal(text, RunSummaryJson.Write(back));
        Assert.Equal(summary.Outcomes, back.Outcomes);
        Assert.Equal(summary.Findings, back.Findings);
        Assert.Equal(summary.Extremes, back.Extremes);
        Assert.Equal(summary.Postures[0].Joints, back.Postures[0].Joints);
        Assert.Contains("\"JointSpeed\"", text, StringComparison.Ordinal);
    }

    [Fact]
    public void Of_YesOrNoCriterionThatFails_CountsAsWorst()
    {
        var conclusion = RunConclusions.Of(new(
            Summary(
                new() { Criterion = Criterion.JointSpeed, Status = CriterionStatus.Pass, Binding = true, WorstUse = 0.4, NearThreshold = 0.8 },
                new() { Criterion = Criterion.Singularity, Status = CriterionStatus.Fail, Binding = false, WorstUse = 7, NearThreshold = 0.8 },
                new() { Criterion = Criterion.Reachable, Status = CriterionStatus.Fail, Binding = true, NearThreshold = 0.8 }),
            null, null));

        Assert.Equal((double.PositiveInfinity, Criterion.Reachable), (conclusion.WorstUse, conclusion.WorstCriterion));
    }

    [Fact]
    public void Of_OnlyAdviceIsOver_TellsTheWorstBindingCriterion()
    {
        var conclusion = RunConclusions.Of(new(
            Summary(
                new() { Criterion = Criterion.JointSpeed, Status = CriterionStatus.Pass, Binding = true, WorstUse = 0.4, NearThreshold = 0.8 },
                new() { Criterion = Criterion.JointPosition, Status = CriterionStatus.Pass, Binding = true, WorstUse = 0.6, NearThreshold = 0.8 },
                new() { Criterion = Criterion.Singularity, Status = CriterionStatus.Fail, Binding = false, WorstUse = 7, NearThreshold = 0.8 }),
            null, null));

        Assert.Equal((0.6, Criterion.JointPosition), (conclusion.WorstUse, conclusion.WorstCriterion));
        Assert.Null(conclusion.Bins);
    }

    [Fact]
    public void Of_NothingToJudge_HasNoUse()
    {
        var conclusion = RunConclusions.Of(new(
            Summary(new CriterionOutcome { Criterion = Criterion.JointSpeed, Status = CriterionStatus.NotAssessable, Binding = true, NearThreshold = 0.8 }), null, null));

        Assert.Null(conclusion.WorstUse);
        Assert.Null(conclusion.WorstCriterion);
    }

    private static RunSummary Summary(params CriterionOutcome[] outcomes) => new()
    {
        NumericsVersion = 1,
        Verdict = Verdict.Fail,
        Outcomes = [.. outcomes],
        Findings = [new(Criterion.JointSpeed, true, true, new(1, 0.004, 0, 0), new(9, 0.036, 1, 1), new(3, 0.012, 1 / 3.0, 1), double.PositiveInfinity, 2)],
        Postures = [new([0.1, -0.2], "elbow up", Verdict.Fail, double.PositiveInfinity, Criterion.JointSpeed, true)],
        PostureChoice = "The only one.",
        SampleCount = 10,
        Period = 0.004,
        CycleTime = 0.036,
        PlannedTime = 0.036,
        PathLength = 0.1,
        CharacteristicLength = 1,
        Extremes = new() { MaxTrackingError = 1e-300, MinSigma = double.Epsilon, MinSigmaPlace = new(0, 0, 0, 0) },
        Remarks = ["One remark."],
    };
}
