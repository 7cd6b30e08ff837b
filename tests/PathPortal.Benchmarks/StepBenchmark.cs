using System.Collections.Immutable;
using System.Diagnostics;
using System.Globalization;
using PathPortal.Engine;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Control;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;
using PathPortal.Engine.Postures;
using PathPortal.Engine.Stepping;
using PathPortal.Engine.Verdicts;

namespace PathPortal.Benchmarks;

/// <summary>Time per simulated step of an invented six-joint arm on a path of about 60 s at 4 ms, at every lane width. The best of several rounds counts.</summary>
internal static class StepBenchmark
{
    private const int Rounds = 7;

    public static void Run(TextWriter output)
    {
        var scenario = Scenario();
        var plan = PathPlanner.Plan(scenario.Path, scenario.Arm, scenario.Controller);
        var finder = new PostureFinder(scenario.Arm, scenario.Cell.ToolInFlange);
        var starts = StartPostures.Find(scenario).Starts.Select(s => s.Joints).Take(8).ToList();
        output.WriteLine(string.Create(CultureInfo.InvariantCulture, $"{starts.Count} start postures"));
        var runs = new PostureRuns(scenario, plan, finder);
        foreach (var width in new[] { 1, 2, 4, 8 })
        {
            var group = Enumerable.Range(0, width).Select(i => starts[i % starts.Count]).ToList();
            var (best, steps) = (double.PositiveInfinity, 0L);
            for (var round = 0; round < Rounds; round++)
            {
                using var trace = new LoopTrace(6, width);
                var watch = Stopwatch.StartNew();
                var outcomes = runs.Run(width, group, trace, null, CancellationToken.None);
                best = Math.Min(best, watch.Elapsed.TotalMilliseconds);
                steps = outcomes.Sum(o => (long)o.Count);
            }

            output.WriteLine(string.Create(
                CultureInfo.InvariantCulture, $"{width} lanes: {best:0.0} ms, {steps} steps, {best * 1e6 / steps:0} ns per step"));
        }

        ReadAndJudge(output, scenario, plan, runs, starts);
        for (var round = 0; round < Rounds; round++)
        {
            var watch = Stopwatch.StartNew();
            var result = Simulator.Run(scenario);
            output.WriteLine(string.Create(
                CultureInfo.InvariantCulture,
                $"whole run, {result.Summary.Postures.Length} postures, {result.Summary.SampleCount} samples: {watch.Elapsed.TotalMilliseconds:0} ms, {result.Summary.Verdict}"));
        }
    }

    private static void ReadAndJudge(
        TextWriter output, Scenario scenario, PathPlan plan, PostureRuns runs, List<ImmutableArray<double>> starts)
    {
        using var trace = new LoopTrace(6, 8);
        var outcomes = runs.Run(8, starts, trace, null, CancellationToken.None);
        for (var round = 0; round < Rounds; round++)
        {
            var watch = Stopwatch.StartNew();
            var (samples, _) = SampleReader.Read(scenario, plan, trace, 0, outcomes[0].Count);
            var read = watch.Elapsed.TotalMilliseconds;
            watch.Restart();
            var judgement = Judgement.Of(scenario, samples, new() { Finished = true, Reachable = true, LoopSound = true });
            output.WriteLine(string.Create(
                CultureInfo.InvariantCulture, $"one posture: read {read:0.0} ms, judge {watch.Elapsed.TotalMilliseconds:0.0} ms, {judgement.Verdict}"));
        }
    }

    private static Scenario Scenario()
    {
        var arm = Arm();
        var tool = RigidTransform.FromTranslation(0, 0, 0.12);
        ImmutableArray<double> start = [.. new double[] { 10, 60, 10, 15, -65, 25 }.Select(d => d * Math.PI / 180)];
        var X_BT = ArmPose.Compute(arm, start.AsSpan()).Tool(tool);
        var orientation = UnitQuaternion.FromMatrix(X_BT.Rotation);
        var waypoints = ImmutableArray.CreateBuilder<Waypoint>();
        for (var i = 0; i <= 12; i++)
        {
            var corner = (i % 4) switch { 0 => new Vector3D(0, 0, 0), 1 => new(0.1, 0, 0), 2 => new(0.1, 0.1, 0), _ => new(0, 0.1, 0) };
            waypoints.Add(new()
            {
                Position = X_BT.Translation + corner,
                Orientation = orientation,
                Motion = MotionKind.Straight,
                Speed = 0.03,
                ProcessOn = true,
            });
        }

        return new()
        {
            Arm = arm,
            Cell = new(RigidTransform.Identity, tool, RigidTransform.Identity),
            Path = new(waypoints.ToImmutable()),
            Controller = new()
            {
                Period = 0.004,
                PositionGain = 10,
                OrientationGain = 10,
                Damping = Damping.Variable(0.05, 0.1),
                ServoTimeConstant = 0.01,
                TimeLaw = TimeLaw.Cubic,
                ToolAcceleration = 5,
                ToolTurnSpeed = 3,
                ToolTurnAcceleration = 30,
            },
            Criteria = new()
            {
                AcrossTolerance = 0.001,
                RevoluteClearance = 0.03,
                PrismaticClearance = 0.001,
                SpeedShare = 1,
                AccelerationShare = 1,
                RequiredSigmaMin = 0.02,
            },
        };
    }

    private static ArmModel Arm()
    {
        var limits = new JointLimits
        {
            Low = new(-2 * Math.PI, "invented"),
            High = new(2 * Math.PI, "invented"),
            Speed = new(3, "invented"),
            Acceleration = new(20, "invented"),
        };
        DhRow Row(int i, double a, double alpha, double d) =>
            new($"j{i}", JointKind.Revolute, a, Angle.FromDegrees(alpha), d, Angle.Zero, 1, 0, limits);
        return new StandardDhTable(
            [Row(1, 0.05, 90, 0.40), Row(2, 0.42, 0, 0), Row(3, 0.03, 90, 0), Row(4, 0, -90, 0.38), Row(5, 0, 90, 0), Row(6, 0, 0, 0.09)],
            RigidTransform.Identity).ToArm("invented", 1);
    }
}
