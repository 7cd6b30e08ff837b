using PathPortal.Engine.Paths;
using PathPortal.Engine.Verdicts;

namespace PathPortal.Engine.Tests.Measures;

/// <summary>Uses against the definitions, computed by hand in each case from the numbers of <see cref="TestScenario"/>.</summary>
public sealed class LimitMeasureTests
{
    private const double UseTolerance = 1e-12; // of the limit; a quotient of two exact numbers

    [Fact]
    public void AcrossPath_InProcess_IsSizeAndAllowanceOverTolerance()
    {
        var samples = TestScenario.Quiet();
        samples.AcrossPath[200] = 0.0007;

        AssertWorst(samples, Criterion.AcrossPath, 200, (0.0007 + 0.0002) / 0.001, value: 0.0007, limit: 0.0008, unit: "m");
    }

    [Fact]
    public void AcrossPath_OutsideProcess_DoesNotCount()
    {
        var samples = TestScenario.Quiet();
        samples.AcrossPath[50] = 1;

        Assert.InRange(Judge(samples).Outcomes.Single(o => o.Criterion == Criterion.AcrossPath).WorstUse!.Value, 0, 0.5);
        Assert.True(double.IsNaN(samples.Use[Criterion.AcrossPath][50]));
    }

    [Fact]
    public void StandOff_AwayOnEitherSide_CountsBySize()
    {
        var samples = TestScenario.Quiet();
        samples.StandOff[250] = -0.0015;

        AssertWorst(samples, Criterion.StandOff, 250, (0.0015 + 0.0001) / 0.002, value: 0.0015, limit: 0.0019, unit: "m");
    }

    [Fact]
    public void ToolAxis_InProcess_IsAngleAndAllowanceOverTolerance()
    {
        var samples = TestScenario.Quiet();
        samples.ToolAxisAngle[150] = 0.015;

        AssertWorst(samples, Criterion.ToolAxis, 150, (0.015 + 0.001) / 0.02, value: 0.015, limit: 0.019, unit: "rad");
    }

    [Fact]
    public void ToolAxis_TaskThatLeavesOrientationFree_DoesNotCount()
    {
        // Waypoint 2 becomes a point task (samples 100 to 199); waypoint 3 keeps its axis.
        var waypoints = TestScenario.Complete.Path.Waypoints;
        var scenario = TestScenario.Complete with { Path = new(waypoints.SetItem(2, waypoints[2] with { Task = TaskKind.Point })) };
        var samples = TestScenario.Quiet();
        (samples.ToolAxisAngle[150], samples.ToolAxisAngle[250]) = (1, 0.005);
        var outcome = Judgement.Of(scenario, samples, TestScenario.Fine).Outcomes.Single(o => o.Criterion == Criterion.ToolAxis);

        Assert.Equal(250, outcome.Place!.Value.Sample);
        Assert.True(double.IsNaN(samples.Use[Criterion.ToolAxis][150]));
    }

    [Fact]
    public void ToolAxis_NoProcessSectionConstrainsIt_IsNotAsked()
    {
        var scenario = TestScenario.Complete with
        {
            Path = new([.. TestScenario.Complete.Path.Waypoints.Select(w => w.ProcessOn ? w with { Task = TaskKind.Point } : w)]),
        };
        var judgement = Judgement.Of(scenario, TestScenario.Quiet(), TestScenario.Fine);

        Assert.Equal(CriterionStatus.NotAsked, judgement.Outcomes.Single(o => o.Criterion == Criterion.ToolAxis).Status);
        Assert.Equal(Verdict.Pass, judgement.Verdict);
    }

    [Fact]
    public void Tracking_InProcess_IsErrorAndAllowanceOverTolerance()
    {
        var samples = TestScenario.Quiet();
        samples.TrackingError[299] = 0.02;

        AssertWorst(samples, Criterion.Tracking, 299, (0.02 + 0.001) / 0.01, value: 0.02, limit: 0.009, unit: "m");
    }

    [Fact]
    public void JointPosition_NearALimit_IsRequiredOverActualClearance()
    {
        var samples = TestScenario.Quiet();
        samples.Joints[3][77] = -1.875; // 0.125 rad from the limit at −2, exact in binary

        AssertWorst(samples, Criterion.JointPosition, 77, 0.1 / 0.125, joint: 3, value: 0.125, limit: 0.1, unit: "rad");
    }

    [Theory]
    [InlineData(2.0)]
    [InlineData(2.5)]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    public void JointPosition_AtBeyondOrNowhere_IsInfinite(double q)
    {
        var samples = TestScenario.Quiet();
        samples.Joints[1][10] = q;

        AssertWorst(samples, Criterion.JointPosition, 10, double.PositiveInfinity, joint: 1);
        Assert.Equal(Verdict.Fail, Judge(samples).Verdict);
    }

    [Fact]
    public void JointPosition_ContinuousJoint_IsTurnsUsedOverAllowed()
    {
        var arm = TestScenario.Arm;
        var scenario = TestScenario.Complete with
        {
            Arm = arm with { Joints = arm.Joints.SetItem(5, arm.Joints[5] with { Limits = new() { Continuous = true, Speed = new(4, "invented") } }) },
        };
        var samples = TestScenario.Quiet();
        samples.Joints[5][100] = -2 * Math.PI;

        var outcome = Judgement.Of(scenario, samples, TestScenario.Fine).Outcomes.Single(o => o.Criterion == Criterion.JointPosition);
        Approximately.Equal(1 / 1.5, outcome.WorstUse!.Value, UseTolerance, "one turn of one and a half");
        Assert.Equal(5, outcome.Joint);
    }

    [Fact]
    public void JointSpeed_DemandBeyondALimiter_ReadsTheDemand()
    {
        // The limiter holds the joint at its allowed 2 rad/s; the path asks for 2.62 rad/s.
        var samples = TestScenario.Quiet();
        samples.JointSpeeds[3][180] = -2;
        samples.JointSpeedDemands[3][180] = -2.62;

        AssertWorst(samples, Criterion.JointSpeed, 180, 1.31, joint: 3, value: 2.62, limit: 2, unit: "rad/s");
    }

    [Fact]
    public void JointAcceleration_Demand_IsOverLimitTimesShare()
    {
        var samples = TestScenario.Quiet();
        samples.JointAccelerationDemands[0][5] = 12;

        AssertWorst(samples, Criterion.JointAcceleration, 5, 12 / (20 * 0.8), joint: 0, value: 12, limit: 16, unit: "rad/s²");
    }

    [Fact]
    public void Singularity_ToolSpaceMove_IsRequiredOverActual()
    {
        var samples = TestScenario.Quiet();
        samples.SigmaMin[150] = 0.04;

        AssertWorst(samples, Criterion.Singularity, 150, 0.05 / 0.04, value: 0.04, limit: 0.05, unit: "1");
    }

    [Theory]
    [InlineData(0)]
    [InlineData(double.NaN)]
    public void Singularity_ZeroOrNotFinite_IsInfinite(double sigma)
    {
        var samples = TestScenario.Quiet();
        samples.SigmaMin[150] = sigma;

        AssertWorst(samples, Criterion.Singularity, 150, double.PositiveInfinity);
    }

    [Fact]
    public void Singularity_JointMove_DoesNotCount()
    {
        // Samples below 100 are on the way to waypoint 1, a joint move.
        var samples = TestScenario.Quiet();
        samples.SigmaMin[50] = 0;

        Assert.True(double.IsNaN(Judge(samples, samples).Use[Criterion.Singularity][50]));
        Assert.Equal(Verdict.Pass, Judge(samples).Verdict);
    }

    [Fact]
    public void ToolSpeed_InProcess_IsDifferenceOverAllowedShareOfProgrammed()
    {
        var samples = TestScenario.Quiet();
        samples.ToolSpeed[222] = 0.17;

        AssertWorst(samples, Criterion.ToolSpeed, 222, 0.03 / (0.1 * 0.2), value: 0.03, limit: 0.02, unit: "m/s");
    }

    [Fact]
    public void ToolSpeed_Dwell_DoesNotCount()
    {
        var samples = TestScenario.Quiet();
        (samples.ReferenceSpeed[222], samples.ToolSpeed[222]) = (0, 0.2);

        Assert.True(double.IsNaN(Judge(samples, samples).Use[Criterion.ToolSpeed][222]));
    }

    [Theory]
    [InlineData(Criterion.AcrossPath)]
    [InlineData(Criterion.StandOff)]
    [InlineData(Criterion.ToolAxis)]
    [InlineData(Criterion.Tracking)]
    [InlineData(Criterion.JointSpeed)]
    [InlineData(Criterion.JointAcceleration)]
    [InlineData(Criterion.ToolSpeed)]
    public void AnyCriterion_ValueThatIsNotFinite_FailsThere(Criterion criterion)
    {
        foreach (var value in new[] { double.NaN, double.PositiveInfinity, double.NegativeInfinity })
        {
            var samples = TestScenario.Quiet();
            var column = criterion switch
            {
                Criterion.AcrossPath => samples.AcrossPath,
                Criterion.StandOff => samples.StandOff,
                Criterion.ToolAxis => samples.ToolAxisAngle,
                Criterion.Tracking => samples.TrackingError,
                Criterion.JointSpeed => samples.JointSpeedDemands[2],
                Criterion.JointAcceleration => samples.JointAccelerationDemands[2],
                _ => samples.ToolSpeed,
            };
            column[201] = value;

            var outcome = AssertWorst(samples, criterion, 201, double.PositiveInfinity);
            Assert.Equal(CriterionStatus.Fail, outcome.Status);
        }
    }

    private static Judgement Judge(RunSamples samples) => Judgement.Of(TestScenario.Complete, samples, TestScenario.Fine);

    private static RunSamples Judge(RunSamples samples, RunSamples same)
    {
        Judge(samples);
        return same;
    }

    private static CriterionOutcome AssertWorst(
        RunSamples samples, Criterion criterion, int sample, double use, int? joint = null, double? value = null, double? limit = null, string? unit = null)
    {
        var outcome = Judge(samples).Outcomes.Single(o => o.Criterion == criterion);
        Assert.Equal(sample, outcome.Place!.Value.Sample);
        Assert.Equal(samples.Use[criterion][sample], outcome.WorstUse);
        if (double.IsInfinity(use))
        {
            Assert.Equal(use, outcome.WorstUse);
        }
        else
        {
            Approximately.Equal(use, outcome.WorstUse!.Value, UseTolerance, $"{criterion}");
        }

        Assert.Equal(joint, joint is null ? null : outcome.Joint);
        if (value is { } v)
        {
            Approximately.Equal(v, outcome.Value!.Value, UseTolerance, "value");
            Approximately.Equal(limit!.Value, outcome.LimitValue!.Value, UseTolerance, "limit");
            Assert.Equal(unit, outcome.Unit);
        }

        return outcome;
    }
}
