using PathPortal.Engine.Arms;
using PathPortal.Engine.Verdicts;

namespace PathPortal.Engine.Tests.Verdicts;

public sealed class JudgementTests
{
    [Fact]
    public void Of_QuietRun_PassesEveryCriterion()
    {
        var judgement = Judge(TestScenario.Quiet());

        Assert.Equal(Verdict.Pass, judgement.Verdict);
        Assert.Equal(Enum.GetValues<Criterion>().Order(), judgement.Outcomes.Select(o => o.Criterion));
        Assert.All(judgement.Outcomes, o => Assert.Equal(CriterionStatus.Pass, o.Status));
        Assert.Empty(judgement.Findings().Kept);
    }

    [Theory]
    [InlineData(1.0, CriterionStatus.Near)]
    [InlineData(1 + 0.9e-9, CriterionStatus.Near)]
    [InlineData(1 + 1.1e-9, CriterionStatus.Fail)]
    [InlineData(0.9, CriterionStatus.Near)]
    [InlineData(0.8999, CriterionStatus.Pass)]
    public void Of_JointSpeedAroundItsThresholds_IsPassNearOrFail(double use, CriterionStatus expected)
    {
        // The sheet puts "near" for joint speed at 0.9; allowed speed is 2 rad/s, so the demand is exact in binary scaling.
        var samples = TestScenario.Quiet();
        samples.JointSpeedDemands[0][30] = 2 * use;

        Assert.Equal(expected, Outcome(Judge(samples), Criterion.JointSpeed).Status);
    }

    [Fact]
    public void Of_AdvisoryCriterionOverItsLimit_DoesNotDecide()
    {
        var scenario = TestScenario.Complete with { Criteria = TestScenario.Criteria with { SingularityBinds = false } };
        var samples = TestScenario.Quiet();
        samples.SigmaMin[200] = 0.001;
        var judgement = Judgement.Of(scenario, samples, TestScenario.Fine);

        Assert.Equal(CriterionStatus.Fail, Outcome(judgement, Criterion.Singularity).Status);
        Assert.False(Outcome(judgement, Criterion.Singularity).Binding);
        Assert.Equal(Verdict.Pass, judgement.Verdict);
        Assert.NotEqual(Criterion.Singularity, judgement.WorstCriterion);
    }

    [Fact]
    public void Of_LimitNotGiven_IsNotAssessableUnlessAnotherJointFails()
    {
        var arm = TestScenario.Arm;
        var scenario = TestScenario.Complete with
        {
            Arm = arm with { Joints = arm.Joints.SetItem(2, arm.Joints[2] with { Limits = arm.Joints[2].Limits with { Speed = null } }) },
        };
        var samples = TestScenario.Quiet();
        var judgement = Judgement.Of(scenario, samples, TestScenario.Fine);

        Assert.Equal(CriterionStatus.NotAssessable, Outcome(judgement, Criterion.JointSpeed).Status);
        Assert.Equal("The speed limit of joint 3 is not given.", Outcome(judgement, Criterion.JointSpeed).Reason);
        Assert.Equal(Verdict.NotAssessable, judgement.Verdict);

        samples.JointSpeedDemands[0][3] = 3;
        Assert.Equal(Verdict.Fail, Judgement.Of(scenario, samples, TestScenario.Fine).Verdict);
    }

    [Fact]
    public void Of_NoProcessSection_IsNotAssessable()
    {
        var samples = TestScenario.Quiet();
        Array.Fill(samples.Process, false);
        var judgement = Judge(samples);

        Assert.Equal(CriterionStatus.NotAssessable, Outcome(judgement, Criterion.AcrossPath).Status);
        Assert.Equal(Verdict.NotAssessable, judgement.Verdict);
    }

    [Fact]
    public void Of_ToleranceNotGiven_IsNotAskedAndHasNoUse()
    {
        var scenario = TestScenario.Complete with { Criteria = TestScenario.Criteria with { TrackingTolerance = null, ToolSpeedTolerance = null } };
        var samples = TestScenario.Quiet();
        var judgement = Judgement.Of(scenario, samples, TestScenario.Fine);

        Assert.Equal(CriterionStatus.NotAsked, Outcome(judgement, Criterion.Tracking).Status);
        Assert.Equal(CriterionStatus.NotAsked, Outcome(judgement, Criterion.ToolSpeed).Status);
        Assert.DoesNotContain(Criterion.Tracking, samples.Use.Keys);
        Assert.Equal(Verdict.Pass, judgement.Verdict);
    }

    [Fact]
    public void Of_YesOrNoCriterionWithNo_FailsWithItsReason()
    {
        var facts = TestScenario.Fine with { Finished = false, NotFinishedReason = "The controller stopped at 3.2 s." };
        var judgement = Judgement.Of(TestScenario.Complete, TestScenario.Quiet(), facts);

        Assert.Equal(Verdict.Fail, judgement.Verdict);
        Assert.Equal(Criterion.Finished, judgement.WorstCriterion);
        Assert.Equal(double.PositiveInfinity, judgement.WorstUse);
        Assert.Equal("The controller stopped at 3.2 s.", Outcome(judgement, Criterion.Finished).Reason);
    }

    [Theory]
    [InlineData(2.5)]
    [InlineData(double.NaN)]
    public void Of_StartOutsideLimits_FailsAndNamesJointValueAndRange(double q)
    {
        var samples = TestScenario.Quiet();
        samples.Joints[4][0] = q;
        var outcome = Outcome(Judge(samples), Criterion.StartInside);

        Assert.Equal(CriterionStatus.Fail, outcome.Status);
        Assert.StartsWith("Joint 5 starts at ", outcome.Reason, StringComparison.Ordinal);
        Assert.EndsWith("outside its range from -114.592° to 114.592°.", outcome.Reason, StringComparison.Ordinal);
    }

    [Fact]
    public void WithoutSamples_UnreachableStart_FailsAndAssessesNothingElse()
    {
        var facts = new RunFacts
        {
            Finished = null,
            NotFinishedReason = "The run could not start.",
            Reachable = false,
            NotReachableReason = "The first waypoint is out of the arm's reach.",
            LoopSound = null,
            NotSoundReason = "The run could not start.",
        };
        var judgement = Judgement.WithoutSamples(TestScenario.Complete with { Start = null }, facts);

        Assert.Equal(Verdict.Fail, judgement.Verdict);
        Assert.Null(judgement.Bins());
        Assert.Empty(judgement.Findings().Kept);
        Assert.All(
            judgement.Outcomes.Where(o => o.Criterion != Criterion.Reachable), o => Assert.Equal(CriterionStatus.NotAssessable, o.Status));
        Assert.All(judgement.Outcomes, o => Assert.False(string.IsNullOrEmpty(o.Reason)));
    }

    [Fact]
    public void Ranking_OfPostures_PutsPassBeforeFailAndLooserBeforeTighter()
    {
        Judgement WithSpeed(double demand)
        {
            var samples = TestScenario.Quiet();
            samples.JointSpeedDemands[0][9] = demand;
            return Judge(samples);
        }

        var (good, tight, bad, worse) = (WithSpeed(0.5), WithSpeed(1.9), WithSpeed(2.5), WithSpeed(9));
        Judgement[] shuffled = [worse, tight, bad, good];

        Assert.Equal([good, tight, bad, worse], shuffled.Order(PostureRanking.Instance));
    }

    [Fact]
    public void Ranking_WorstUsesThatDifferInTheLastBits_LooksAtTheRest()
    {
        Judgement With(double demand, double q)
        {
            var samples = TestScenario.Quiet();
            samples.JointSpeedDemands[0][9] = demand;
            samples.Joints[5][9] = q;
            return Judge(samples);
        }

        // The second is worse by 1e-12 in its worst use and has far more room in joint 6.
        var (wound, free) = (With(2.5, 1.85), With(2.5 + 1e-12, 0));

        Assert.True(wound.WorstUse < free.WorstUse);
        Assert.Equal([free, wound], new[] { wound, free }.Order(PostureRanking.Instance));
    }

    private static Judgement Judge(RunSamples samples) => Judgement.Of(TestScenario.Complete, samples, TestScenario.Fine);

    private static CriterionOutcome Outcome(Judgement judgement, Criterion criterion) =>
        judgement.Outcomes.Single(o => o.Criterion == criterion);
}
