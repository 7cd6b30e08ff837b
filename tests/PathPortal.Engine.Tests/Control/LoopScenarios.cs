using System.Collections.Immutable;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Control;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;
using PathPortal.Engine.Verdicts;

namespace PathPortal.Engine.Tests.Control;

/// <summary>Scenarios of the reference runs: the invented six-joint arm, base, cell and work frame in one.</summary>
internal static class LoopScenarios
{
    /// <summary>Tool S of the reference runs.</summary>
    public static RigidTransform StraightTool => RigidTransform.FromTranslation(0, 0, 0.12);

    /// <summary>Tool B of the reference runs: Trans(0.03, 0, 0.12) RotY(35°).</summary>
    public static RigidTransform BentTool => new(RotationMatrix.AboutY(Angle.FromDegrees(35)), new(0.03, 0, 0.12));

    public static ImmutableArray<double> SquareStart => Degrees(10, 60, 10, 15, -65, 25);

    /// <summary>Gains of 10 1/s, 4 ms, no limits, feedforward from the start of the interval, cubic law.</summary>
    public static ControllerSettings Controller { get; } = new()
    {
        Period = 0.004,
        PositionGain = 10,
        OrientationGain = 10,
        Feedforward = Feedforward.Start,
        LimitsSpeed = false,
        TimeLaw = TimeLaw.Cubic,
        ToolAcceleration = 10,
        ToolTurnSpeed = 10,
        ToolTurnAcceleration = 100,
    };

    /// <summary>Asks for nothing that these runs could fail.</summary>
    public static CriteriaSheet Criteria { get; } = new()
    {
        RevoluteClearance = 0.01,
        PrismaticClearance = 0.001,
        SpeedShare = 1,
        AccelerationShare = 1,
        RequiredSigmaMin = 0.001,
    };

    public static ImmutableArray<double> Degrees(params double[] values) => [.. values.Select(v => v * (Math.PI / 180))];

    /// <summary>The square of 100 mm a side in a plane parallel to base xy, 5 s a side: cubic with a peak of 30 mm/s. Orientation held.</summary>
    public static Scenario Square(RigidTransform tool, TaskKind task, ControllerSettings controller)
    {
        var start = ToolPose(SquareStart, tool);
        Vector3D[] corners = [new(0, 0, 0), new(0.1, 0, 0), new(0.1, 0.1, 0), new(0, 0.1, 0), new(0, 0, 0)];
        return Straight(SquareStart, tool, [.. corners.Select(c => start.Translation + c)], 0.03, task, controller);
    }

    /// <summary>Straight moves between points from a start posture, orientation held as it is there.</summary>
    public static Scenario Straight(
        ImmutableArray<double> start, RigidTransform tool, Vector3D[] points, double speed, TaskKind task, ControllerSettings controller)
    {
        var orientation = UnitQuaternion.FromMatrix(ToolPose(start, tool).Rotation);
        return Scenario(start, tool, controller, [.. points.Select(p => Point(p, orientation) with { Speed = speed, Task = task })]);
    }

    public static Scenario Scenario(
        ImmutableArray<double> start, RigidTransform tool, ControllerSettings controller, ImmutableArray<Waypoint> waypoints) => new()
        {
            Arm = TestArms.SixJoints(),
            Cell = new(RigidTransform.Identity, tool, RigidTransform.Identity),
            Controller = controller,
            Path = new(waypoints),
            Criteria = Criteria,
            Start = start,
        };

    public static Waypoint Point(Vector3D position, UnitQuaternion orientation) =>
        new() { Position = position, Orientation = orientation, Motion = MotionKind.Straight, Speed = 0.03 };

    public static RigidTransform ToolPose(ImmutableArray<double> joints, RigidTransform tool) =>
        ArmPose.Compute(TestArms.SixJoints(), joints.AsSpan()).Tool(tool);

    public static RunSamples Run(Scenario scenario)
    {
        var result = Simulator.Run(scenario, keepSamples: true, cancellation: TestContext.Current.CancellationToken);
        return result.Samples ?? throw new InvalidOperationException(string.Join(" ", result.Summary.Remarks));
    }
}
