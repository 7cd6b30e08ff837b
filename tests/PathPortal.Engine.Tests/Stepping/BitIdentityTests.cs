using System.Collections.Immutable;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Control;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;
using PathPortal.Engine.Postures;
using PathPortal.Engine.Stepping;
using PathPortal.Engine.Tests.Control;

namespace PathPortal.Engine.Tests.Stepping;

/// <summary>A simulation gives the same bits alone, in any company and at any width.</summary>
public sealed class BitIdentityTests
{
    private static readonly JointLimits Limits = new()
    {
        Low = new(-3.5, "invented"),
        High = new(3.5, "invented"),
        Speed = new(0.2, "invented"),
        Acceleration = new(3, "invented"),
    };

    public static TheoryData<string> Controllers => ["plain", "damped with lag and delay", "slow path", "per joint, commanded", "free turn"];

    [Theory]
    [MemberData(nameof(Controllers))]
    public void Run_AnyWidthAndCompany_GivesTheSameBits(string name)
    {
        var scenario = Scenario(name);
        var plan = PathPlanner.Plan(scenario.Path, scenario.Arm, scenario.Controller);
        Assert.Empty(plan.Problems);
        var runs = new PostureRuns(scenario, plan, new PostureFinder(scenario.Arm, scenario.Cell.ToolInFlange));
        var starts = Starts();
        var alone = starts.Select(start => Trace(runs, 1, [start])[0]).ToArray();
        foreach (var width in new[] { 2, 4, 8 })
        {
            for (var first = 0; first < starts.Length; first += width)
            {
                var group = starts.Skip(first).Take(width).Reverse().ToArray();
                var together = Trace(runs, width, group);
                for (var lane = 0; lane < group.Length; lane++)
                {
                    Same(alone[Array.IndexOf(starts, group[lane])], together[lane], $"{name}, width {width}, lane {lane}");
                }
            }
        }
    }

    [Fact]
    public void Run_Twice_GivesTheSameBits()
    {
        var scenario = Scenario("plain") with { Start = null, Arm = TestScenario.Arm };
        var first = Simulator.Run(scenario, keepSamples: true, cancellation: TestContext.Current.CancellationToken);
        var second = Simulator.Run(scenario, keepSamples: true, cancellation: TestContext.Current.CancellationToken);
        Assert.Equal(Bits(first.Samples!.Joints[3]), Bits(second.Samples!.Joints[3]));
        Assert.Equal(Bits(first.Samples!.SigmaMin), Bits(second.Samples!.SigmaMin));
        Assert.Equal(first.Bins!.WorstSample, second.Bins!.WorstSample);
    }

    private static long[] Bits(double[] values) => Array.ConvertAll(values, BitConverter.DoubleToInt64Bits);

    private static (LaneOutcome Outcome, double[][] Channels)[] Trace(PostureRuns runs, int width, ImmutableArray<double>[] starts)
    {
        using var trace = new LoopTrace(6, width);
        var outcomes = runs.Run(width, starts, trace, null, TestContext.Current.CancellationToken);
        return [.. outcomes.Select((outcome, lane) => (outcome, Enumerable.Range(0, trace.ToolSpeed + 1).Select(channel =>
        {
            var column = new double[outcome.Count];
            trace.Copy(channel, lane, column);
            return column;
        }).ToArray()))];
    }

    private static void Same((LaneOutcome Outcome, double[][] Channels) x, (LaneOutcome Outcome, double[][] Channels) y, string what)
    {
        Assert.Equal(x.Outcome, y.Outcome);
        for (var channel = 0; channel < x.Channels.Length; channel++)
        {
            for (var k = 0; k < x.Channels[channel].Length; k++)
            {
                var (a, b) = (x.Channels[channel][k], y.Channels[channel][k]);
                if (BitConverter.DoubleToInt64Bits(a) != BitConverter.DoubleToInt64Bits(b) && !(double.IsNaN(a) && double.IsNaN(b)))
                {
                    Assert.Fail($"{what}: channel {channel} at step {k}: {a:R} alone, {b:R} in company.");
                }
            }
        }
    }

    // Eight starts around one pose, two of them far off, so that lanes damp, saturate and end differently.
    private static ImmutableArray<double>[] Starts()
    {
        var random = new Random(5);
        return [.. Enumerable.Range(0, 8).Select(i =>
            LoopScenarios.SquareStart.Select(q => q + (i is 3 or 6 ? 0.6 : 0.01) * (random.NextDouble() - 0.5)).ToImmutableArray())];
    }

    private static Scenario Scenario(string name)
    {
        var X_BT = LoopScenarios.ToolPose(LoopScenarios.SquareStart, LoopScenarios.BentTool);
        var orientation = UnitQuaternion.FromMatrix(X_BT.Rotation);
        var turned = RotationVector.ToQuaternion(new(0.1, -0.2, 0.3)) * orientation;
        var task = name == "free turn" ? TaskKind.Axis : TaskKind.Pose;
        Waypoint At(double x, double y, double z) => LoopScenarios.Point(X_BT.Translation + new Vector3D(x, y, z), orientation) with
        {
            Speed = 0.2,
            Task = task,
        };
        var controller = LoopScenarios.Controller with { TimeLaw = TimeLaw.Trapezoidal, LimitsSpeed = true, LimitsAcceleration = true, ToolAcceleration = 2 };
        return LoopScenarios.Scenario(
            LoopScenarios.SquareStart,
            LoopScenarios.BentTool,
            name switch
            {
                "damped with lag and delay" => controller with
                {
                    Damping = Damping.Variable(0.1, 0.2),
                    ServoTimeConstant = 0.02,
                    CommandDelay = 2,
                    MeasurementDelay = 1,
                    Feedforward = Feedforward.Middle,
                },
                "slow path" => controller with { LimitReaction = LimitReaction.SlowPath, Feedforward = Feedforward.Difference },
                "per joint, commanded" => controller with
                {
                    SpeedLimiter = SpeedLimiter.PerJoint,
                    Feedback = FeedbackSource.Commanded,
                    Feedforward = Feedforward.None,
                    ServoTimeConstant = 0.01,
                },
                "free turn" => controller with { MidRangeGain = 0.5 },
                _ => controller,
            },
            [
                At(0, 0, 0),
                At(0.06, 0, 0) with { CornerReach = 0.01 },
                At(0.06, 0.05, 0.02) with { Orientation = turned, Dwell = 0.05 },
                At(0, 0, -0.05) with { Motion = MotionKind.Joint, JointSpeedShare = 0.8 },
                At(0.02, 0, -0.05) with { Task = name == "free turn" ? TaskKind.Point : TaskKind.Pose },
            ]) with
        { Arm = TestArms.SixJoints(Limits) };
    }
}
