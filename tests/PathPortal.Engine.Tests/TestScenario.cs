using System.Collections.Immutable;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Control;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;
using PathPortal.Engine.Verdicts;

namespace PathPortal.Engine.Tests;

/// <summary>An invented scenario with every input set, and samples of a run on it in which nothing is near a limit.</summary>
public static class TestScenario
{
    public static ArmModel Arm { get; } = TestArms.SixJoints(new()
    {
        Low = new(-2, "invented"),
        High = new(2, "invented"),
        Speed = new(4, "invented"),
        Acceleration = new(20, "invented"),
        Jerk = new(200, "invented"),
    });

    public static CriteriaSheet Criteria { get; } = new()
    {
        AcrossTolerance = 0.001,
        AcrossAllowance = 0.0002,
        StandOffTolerance = 0.002,
        StandOffAllowance = 0.0001,
        AxisTolerance = 0.02,
        AxisAllowance = 0.001,
        TrackingTolerance = 0.01,
        TrackingAllowance = 0.001,
        RevoluteClearance = 0.1,
        PrismaticClearance = 0.02,
        ContinuousTurns = 1.5,
        SpeedShare = 0.5,
        AccelerationShare = 0.8,
        RequiredSigmaMin = 0.05,
        SingularityBinds = true,
        ToolSpeedTolerance = 0.1,
        Near = new Dictionary<Criterion, double> { [Criterion.JointSpeed] = 0.9 },
    };

    public static Scenario Complete { get; } = new()
    {
        Arm = Arm,
        Cell = new(
            RigidTransform.FromTranslation(0.1, 0.2, 0.3),
            RigidTransform.FromTranslation(0, 0, 0.12),
            RigidTransform.FromTranslation(0.1, 0.2, 0.4)),
        Controller = new()
        {
            Period = 0.004,
            PositionGain = 10,
            OrientationGain = 8,
            Damping = Damping.Variable(0.05, 0.1),
            MidRangeGain = 0.1,
            ServoTimeConstant = 0.02,
            MeasurementDelay = 1,
            CommandDelay = 2,
            ToolAcceleration = 1.5,
            ToolTurnSpeed = 2,
            ToolTurnAcceleration = 6,
        },
        Criteria = Criteria,
        Start = [0.1, 0.2, 0.3, 0.4, 0.5, 0.6],
        FreeTurn = 0.25,
        Path = new(
        [
            Point(0.6, MotionKind.Straight),
            Point(0.7, MotionKind.Joint) with { Joints = [0.1, 0.2, 0.3, 0.4, 0.5, 0.61] },
            Point(0.8, MotionKind.Straight) with { Task = TaskKind.Axis, CornerReach = 0.01, ProcessOn = true, LeadIn = 0.005 },
            Point(0.9, MotionKind.Straight) with { Dwell = 0.5, ProcessOn = true },
        ]),
    };

    /// <summary>Samples of a run that keeps well away from every limit: process from sample 40 % on, waypoints 1 to 3 in thirds.</summary>
    public static RunSamples Quiet(int count = 300)
    {
        double[] Filled(double value) => [.. Enumerable.Repeat(value, count)];
        double[][] Columns(int number, double value) => [.. Enumerable.Range(0, number).Select(_ => Filled(value))];
        return new()
        {
            Count = count,
            JointCount = 6,
            Period = 0.004,
            ReferenceTime = [.. Enumerable.Range(0, count).Select(k => k * 0.004)],
            PathFraction = [.. Enumerable.Range(0, count).Select(k => k / (count - 1.0))],
            Waypoint = [.. Enumerable.Range(0, count).Select(k => 1 + 3 * k / count)],
            Process = [.. Enumerable.Range(0, count).Select(k => k >= 0.4 * count)],
            Joints = Columns(6, 0.5),
            JointSpeeds = Columns(6, 0.1),
            JointSpeedDemands = Columns(6, 0.1),
            JointAccelerationDemands = Columns(6, 0.5),
            ReferencePosition = Columns(3, 0.1),
            ReferenceOrientation = Columns(4, 0.5),
            ToolPosition = Columns(3, 0.1),
            ToolOrientation = Columns(4, 0.5),
            TrackingError = Filled(0.0001),
            TurnError = Filled(0.0001),
            AcrossPath = Filled(0.0001),
            StandOff = Filled(0.0001),
            ToolAxisAngle = Filled(0.0001),
            ToolSpeed = Filled(0.2),
            ReferenceSpeed = Filled(0.2),
            SigmaMin = Filled(0.5),
            SigmaMax = Filled(1.5),
            DampingSquared = Filled(0),
            SpeedScale = Filled(1),
            PathScale = Filled(1),
        };
    }

    public static RunFacts Fine { get; } = new() { Finished = true, Reachable = true, LoopSound = true };

    private static Waypoint Point(double x, MotionKind motion) => new()
    {
        SourceLine = 7,
        Label = "a label",
        Position = new(x, 0.05, 0.3),
        Orientation = UnitQuaternion.FromComponents(0.1, 0.9, 0.2, -0.1),
        Motion = motion,
        Speed = 0.2,
        JointSpeedShare = 0.4,
    };
}
