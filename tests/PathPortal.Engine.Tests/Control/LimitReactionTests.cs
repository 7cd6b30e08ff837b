using PathPortal.Engine.Arms;
using PathPortal.Engine.Control;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;
using PathPortal.Engine.Tests.Published;
using PathPortal.Engine.Verdicts;

namespace PathPortal.Engine.Tests.Control;

/// <summary>What happens at limits, at singular postures, on joint moves and with values that are not finite.</summary>
public sealed class LimitReactionTests
{
    // A limit is kept to rounding, relative.
    private const double Rounding = 1e-9;

    private static readonly JointLimits Slow = new() { Speed = new(0.1, "invented"), Acceleration = new(2, "invented") };

    [Fact]
    public void Run_KeepTime_HoldsSpeedAndShowsTheDemand()
    {
        var samples = LoopScenarios.Run(Square(LimitReaction.KeepTime));
        Assert.True(Fastest(samples.JointSpeeds) <= 0.1 * (1 + Rounding));
        Assert.True(Fastest(samples.JointSpeedDemands) > 0.14);
        Assert.True(samples.SpeedScale.Min() < 0.9);
        Assert.All(samples.PathScale, rate => Assert.Equal(1, rate));
        Assert.True(samples.TrackingError.Max() > 1e-4);
    }

    [Fact]
    public void Run_SlowPath_StaysOnThePathAndTakesLonger()
    {
        var samples = LoopScenarios.Run(Square(LimitReaction.SlowPath));
        Assert.True(Fastest(samples.JointSpeeds) <= 0.1 * (1 + Rounding));
        Assert.True(Fastest(samples.JointSpeedDemands) > 0.14);
        Assert.True((samples.Count - 1) * samples.Period > 20.5, $"{samples.Count} samples");

        // The reference waits, so the arm is on it but for the change of rate within a period.
        Assert.True(samples.TrackingError.Max() < 5e-5, $"{samples.TrackingError.Max()} m");
        Assert.True(samples.PathScale.Min() < 0.9);
    }

    [Fact]
    public void Run_SlowPathWithoutFeedforward_FinishesInsideLimits()
    {
        var scenario = Square(LimitReaction.SlowPath);
        scenario = scenario with { Controller = scenario.Controller with { Feedforward = Feedforward.None } };
        var samples = LoopScenarios.Run(scenario);
        Assert.True(Fastest(samples.JointSpeeds) <= 0.1 * (1 + Rounding));
        Assert.True(samples.PathFraction[^1] > 0.9999);
    }

    [Fact]
    public void Run_Stop_EndsAtTheLimitUnfinished()
    {
        var result = Simulator.Run(Square(LimitReaction.Stop), keepSamples: true, cancellation: TestContext.Current.CancellationToken);
        Assert.True(result.Samples!.Count < 1200, $"{result.Samples.Count} samples");
        var finished = result.Summary.Outcomes.Single(o => o.Criterion == Criterion.Finished);
        Assert.Equal(CriterionStatus.Fail, finished.Status);
        Assert.Contains("limit", finished.Reason, StringComparison.Ordinal);
        Assert.Equal(Verdict.Fail, result.Summary.Verdict);
    }

    [Fact]
    public void Run_AccelerationLimit_IsKept()
    {
        var arm = TestArms.SixJoints(new JointLimits { Speed = new(5, "invented"), Acceleration = new(0.05, "invented") });
        var scenario = LoopScenarios.Square(LoopScenarios.BentTool, TaskKind.Pose, LoopScenarios.Controller with { LimitsAcceleration = true });
        var samples = LoopScenarios.Run(scenario with { Arm = arm });
        foreach (var joint in samples.JointSpeeds)
        {
            for (var k = 1; k < samples.Count; k++)
            {
                Assert.True(Math.Abs(joint[k] - joint[k - 1]) <= 0.05 * samples.Period * (1 + Rounding));
            }
        }

        Assert.True(Fastest(samples.JointAccelerationDemands) > 0.06);
    }

    [Fact]
    public void Run_SpeedLimiters_ScaleOrClipAsPublished()
    {
        // The published demand arises at the first sample of a gantry held away from its pose, with unit gain.
        var published = PublishedCase.Get("CLIK-10");
        var demand = published.Input("qdot");
        foreach (var (limiter, name) in new[] { (SpeedLimiter.CommonScaling, "scaled"), (SpeedLimiter.PerJoint, "clipped") })
        {
            var limits = new JointLimits { Speed = new(published.Input("limit")[0], "the case") };
            ChainLink Slide(int i, Vector3D axis) => ChainLink.AboutAxis($"j{i}", JointKind.Prismatic, RigidTransform.Identity, axis, 1, 0, limits);
            var held = LoopScenarios.Point(new(demand[0], demand[1], demand[2]), UnitQuaternion.Identity) with { Task = TaskKind.Point };
            var scenario = LoopScenarios.Scenario(
                [0, 0, 0],
                RigidTransform.Identity,
                LoopScenarios.Controller with { LimitsSpeed = true, SpeedLimiter = limiter, PositionGain = 1, OrientationGain = 1 },
                [held with { Dwell = 0.02 }, held]) with
            {
                Arm = ChainLink.ToArm("slides", [Slide(1, Vector3D.UnitX), Slide(2, Vector3D.UnitY), Slide(3, Vector3D.UnitZ)], RigidTransform.Identity, 1),
            };
            var samples = LoopScenarios.Run(scenario);
            Approximately.Equal(
                PublishedCase.Numbers(published.Expected.GetProperty(name)), [.. samples.JointSpeeds.Select(j => j[0])], published.Tolerance, published.Source);
        }
    }

    [Fact]
    public void Run_ThroughSingularityUndamped_StopsWithStatus()
    {
        // Joint 5 straight: the wrist is singular at the first sample.
        var start = LoopScenarios.Degrees(0, 50, 20, 0, 0, 0);
        var from = LoopScenarios.ToolPose(start, LoopScenarios.StraightTool).Translation;
        var scenario = LoopScenarios.Straight(
            start, LoopScenarios.StraightTool, [from, from + new Vector3D(0, 0.05, 0)], 0.05, TaskKind.Pose, LoopScenarios.Controller);
        var result = Simulator.Run(scenario, keepSamples: true, cancellation: TestContext.Current.CancellationToken);
        var finished = result.Summary.Outcomes.Single(o => o.Criterion == Criterion.Finished);
        Assert.Equal(CriterionStatus.Fail, finished.Status);
        Assert.Contains("singular", finished.Reason, StringComparison.Ordinal);
        Assert.Equal(1, result.Summary.SampleCount);
    }

    [Fact]
    public void Run_ValuesRunOut_EndsWithStatusAndFails()
    {
        // Far beyond the stable gain the joints grow until sine and cosine have no angle to turn by.
        var scenario = LoopScenarios.Square(
            LoopScenarios.BentTool,
            TaskKind.Pose,
            LoopScenarios.Controller with { PositionGain = 1e12, OrientationGain = 1e12, Damping = Damping.Constant(1e-9) });
        var result = Simulator.Run(scenario, keepSamples: true, cancellation: TestContext.Current.CancellationToken);
        Assert.Equal(Verdict.Fail, result.Summary.Verdict);
        var finished = result.Summary.Outcomes.Single(o => o.Criterion == Criterion.Finished);
        Assert.Contains("not finite", finished.Reason, StringComparison.Ordinal);
    }

    [Fact]
    public void Run_JointMove_ArrivesAtTheGivenPosture()
    {
        var start = LoopScenarios.SquareStart;
        var end = LoopScenarios.Degrees(-20, 50, 20, -10, -50, 40);
        var arm = TestArms.SixJoints(new JointLimits { Speed = new(2, "invented"), Acceleration = new(10, "invented") });
        Waypoint At(System.Collections.Immutable.ImmutableArray<double> joints)
        {
            var pose = LoopScenarios.ToolPose(joints, LoopScenarios.BentTool);
            return LoopScenarios.Point(pose.Translation, UnitQuaternion.FromMatrix(pose.Rotation));
        }

        var scenario = LoopScenarios.Scenario(
            start,
            LoopScenarios.BentTool,
            LoopScenarios.Controller with { LimitsSpeed = true, TimeLaw = TimeLaw.Trapezoidal, Feedforward = Feedforward.Difference },
            [At(start), At(end) with { Motion = MotionKind.Joint, Joints = end, JointSpeedShare = 0.5 }]) with
        { Arm = arm };
        var samples = LoopScenarios.Run(scenario);

        // The loop ends within its settling bound; a posture given is finished to the programmed pose first.
        Approximately.Equal(end.ToArray(), [.. samples.Joints.Select(j => j[^1])], 1e-4, "joints at the end (rad)");
        Assert.True(Fastest(samples.JointSpeedDemands) <= 1 * (1 + 1e-6));
        Assert.All(samples.SigmaMin, sigma => Assert.True(double.IsNaN(sigma)));
        Approximately.Equal(1, samples.PathFraction[^1], 1e-12, "path fraction");
    }

    [Fact]
    public void Run_JointMoveWithPostureOfAnotherPose_IsUnreachable()
    {
        var arm = TestArms.SixJoints(new JointLimits { Speed = new(2, "invented") });
        var pose = LoopScenarios.ToolPose(LoopScenarios.SquareStart, LoopScenarios.BentTool);
        var point = LoopScenarios.Point(pose.Translation, UnitQuaternion.FromMatrix(pose.Rotation));
        var scenario = LoopScenarios.Scenario(
            LoopScenarios.SquareStart,
            LoopScenarios.BentTool,
            LoopScenarios.Controller,
            [point, point with { Position = point.Position + new Vector3D(0.1, 0, 0), Motion = MotionKind.Joint, Joints = LoopScenarios.SquareStart }]) with
        {
            Arm = arm,
        };
        var result = Simulator.Run(scenario, cancellation: TestContext.Current.CancellationToken);
        var reachable = result.Summary.Outcomes.Single(o => o.Criterion == Criterion.Reachable);
        Assert.Equal(CriterionStatus.Fail, reachable.Status);
        Assert.Contains("waypoint 2", reachable.Reason, StringComparison.Ordinal);
    }

    [Fact]
    public void Run_PointOutOfReach_SaysWhich()
    {
        var from = LoopScenarios.ToolPose(LoopScenarios.SquareStart, LoopScenarios.StraightTool).Translation;
        var scenario = LoopScenarios.Straight(
            LoopScenarios.SquareStart,
            LoopScenarios.StraightTool,
            [from, from + new Vector3D(0.05, 0, 0), from + new Vector3D(0.8, 0, 0)],
            0.2,
            TaskKind.Pose,
            LoopScenarios.Controller with { Damping = Damping.Variable(0.05, 0.1), LimitsSpeed = true });
        var arm = TestArms.SixJoints(new JointLimits { Speed = new(3, "invented") });
        var result = Simulator.Run(scenario with { Arm = arm }, cancellation: TestContext.Current.CancellationToken);
        var reachable = result.Summary.Outcomes.Single(o => o.Criterion == Criterion.Reachable);
        Assert.Equal(CriterionStatus.Fail, reachable.Status);
        Assert.Contains("Waypoint 3", reachable.Reason, StringComparison.Ordinal);
    }

    [Fact]
    public void Run_PathThatCannotBePlanned_FailsWithWaypointAndLine()
    {
        var scenario = LoopScenarios.Square(LoopScenarios.BentTool, TaskKind.Pose, LoopScenarios.Controller);
        var corner = scenario.Path.Waypoints[1] with { CornerReach = 0.2, SourceLine = 9 };
        var result = Simulator.Run(
            scenario with { Path = new(scenario.Path.Waypoints.SetItem(1, corner)) }, cancellation: TestContext.Current.CancellationToken);
        Assert.Equal(Verdict.Fail, result.Summary.Verdict);
        Assert.Null(result.Bins);
        Assert.Contains(result.Summary.Remarks, r => r.Contains("Waypoint 2 (line 9), corner reach", StringComparison.Ordinal));
    }

    private static Scenario Square(LimitReaction reaction) =>
        LoopScenarios.Square(
            LoopScenarios.BentTool, TaskKind.Pose, LoopScenarios.Controller with { LimitsSpeed = true, LimitReaction = reaction, Feedforward = Feedforward.Difference })
            with
        { Arm = TestArms.SixJoints(Slow) };

    private static double Fastest(double[][] joints) => joints.Max(j => j.Max(Math.Abs));
}
