using System.Collections.Immutable;
using PathPortal.Engine;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Control;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;
using PathPortal.Engine.Verdicts;

namespace PathPortal.TestSupport.Runs;

/// <summary>
/// A run that no engine computed: smooth invented motion with one stretch over a joint speed limit, and, where a test wants it, a spike of a
/// single sample. For tests of what becomes of samples, not of their truth.
/// </summary>
public sealed class InventedRun
{
    private readonly double[][] _q, _v, _a;

    private InventedRun(int count, double period)
    {
        Count = count;
        Period = period;
        (_q, _v, _a) = (Columns(6), Columns(6), Columns(6));
    }

    public int Count { get; }

    public double Period { get; }

    public required RunSamples Samples { get; init; }

    public required Scenario Scenario { get; init; }

    public UseBins Bins { get; private init; } = null!;

    public RunSummary Summary { get; private init; } = null!;

    /// <param name="spike">Sample at which the deviation across the path jumps for one sample; −1 for none.</param>
    public static InventedRun Create(int count = 15_001, double period = 0.004, int spike = -1)
    {
        var motion = new InventedRun(count, period) { Samples = null!, Scenario = null! };
        motion.Move();
        var samples = motion.Measure(spike);
        var scenario = ScenarioOf(period);
        var judgement = Judgement.Of(scenario, samples, new() { Finished = true, Reachable = true, LoopSound = true });
        return new InventedRun(count, period)
        {
            Samples = samples,
            Scenario = scenario,
            Bins = judgement.Bins()!,
            Summary = SummaryOf(samples, judgement),
        };
    }

    private void Move()
    {
        for (var k = 0; k < Count; k++)
        {
            var u = (double)k / (Count - 1);
            for (var j = 0; j < 6; j++)
                _q[j][k] = Middle[j] + Swing[j] * Math.Sin(2 * Math.PI * (Turns[j] * u + 0.07 * j)) + (j == 4 ? Hurry(u) : 0);
        }
        for (var j = 0; j < 6; j++)
            for (var k = 0; k < Count; k++)
                _v[j][k] = (_q[j][Math.Min(k + 1, Count - 1)] - _q[j][Math.Max(k - 1, 0)]) / (2 * Period);
        for (var j = 0; j < 6; j++)
            for (var k = 1; k < Count - 1; k++)
                _a[j][k] = (_v[j][k + 1] - _v[j][k - 1]) / (2 * Period);
    }

    private static readonly double[] Middle = [0.05, 0.72, -0.25, 0.1, -0.55, 0.3];
    private static readonly double[] Swing = [0.32, 0.16, 0.22, 0.6, 0.3, 1.2];
    private static readonly double[] Turns = [2, 3, 3, 2, 4, 3];

    // A quick half turn of the wrist in the second half of the run.
    private static double Hurry(double u) => 1.05 * Math.Tanh((u - 0.612) * 60 / 0.17);

    private RunSamples Measure(int spike)
    {
        var s = NewSamples();
        for (var k = 0; k < Count; k++)
        {
            var u = (double)k / (Count - 1);
            Span<double> q = [_q[0][k], _q[1][k], _q[2][k], _q[3][k], _q[4][k], _q[5][k]];
            var tool = InventedArm.ToolInWork(q).Translation;
            var process = u is > 0.08 and < 0.46 or > 0.53 and < 0.95;
            var lag = 0.0004 + 0.0011 * Math.Exp(-Math.Pow((u - 0.612) / 0.008, 2)) + 0.00025 * Math.Sin(40 * u);
            double[] at = [tool.X, tool.Y, tool.Z];
            for (var axis = 0; axis < 3; axis++)
            {
                s.ToolPosition[axis][k] = at[axis];
                s.ReferencePosition[axis][k] = at[axis] + lag / 2;
            }
            s.ToolOrientation[0][k] = s.ReferenceOrientation[0][k] = 1;
            s.ReferenceTime[k] = k * Period;
            s.PathFraction[k] = u;
            s.Waypoint[k] = Math.Min(1 + (int)(u * 12), 12);
            s.Process[k] = process;
            s.TrackingError[k] = lag * 2.2;
            s.TurnError[k] = lag * 3;
            s.AcrossPath[k] = process ? lag + (k == spike ? 0.004 : 0) : double.NaN;
            s.StandOff[k] = process ? lag * 0.4 : double.NaN;
            s.ToolAxisAngle[k] = process ? lag * 2 : double.NaN;
            s.ReferenceSpeed[k] = 0.12 + 0.06 * Math.Sin(9 * u);
            s.ToolSpeed[k] = s.ReferenceSpeed[k] * (1 - 0.1 * lag / 0.0015);
            s.SigmaMin[k] = 0.03 + 0.09 * Math.Abs(Math.Sin(7 * u + 0.4));
            s.SigmaMax[k] = 2.1;
            s.DampingSquared[k] = s.SigmaMin[k] < 0.05 ? 4e-4 * (1 - Math.Pow(s.SigmaMin[k] / 0.05, 2)) : 0;
            s.SpeedScale[k] = s.PathScale[k] = 1;
        }
        return s;
    }

    public static CriteriaSheet Sheet { get; } = new()
    {
        AcrossTolerance = 0.0018,
        StandOffTolerance = 0.002,
        AxisTolerance = 0.02,
        RevoluteClearance = 5 * Math.PI / 180,
        PrismaticClearance = 0.01,
        SpeedShare = 0.9,
        AccelerationShare = 0.9,
        RequiredSigmaMin = 0.028,
        ToolSpeedTolerance = 0.15,
    };

    private static Scenario ScenarioOf(double period) => new()
    {
        Arm = InventedArm.Model,
        Cell = InventedArm.Cell,
        Controller = new() { Period = period, PositionGain = 20, OrientationGain = 20, ToolAcceleration = 2, ToolTurnSpeed = 3, ToolTurnAcceleration = 10 },
        Path = new([.. Enumerable.Range(0, 13).Select(i => new Waypoint
        {
            Label = i switch { 0 => "approach", 1 => "seam start", 6 => "corner", 8 => "lip", 12 => "clear", _ => "" },
            Position = new(0.1 * i, 0, 0),
            Orientation = UnitQuaternion.Identity,
            Motion = MotionKind.Straight,
            Speed = 0.15,
            ProcessOn = i is > 0 and < 12,
        })]),
        Criteria = Sheet,
    };

    private static RunSummary SummaryOf(RunSamples s, Judgement judgement) => new()
    {
        NumericsVersion = 1,
        Verdict = judgement.Verdict,
        Outcomes = judgement.Outcomes,
        Findings = judgement.Findings().Kept,
        Postures =
        [
            new([.. s.Joints.Select(q => q[0])], "shoulder front, elbow up, wrist not flipped", judgement.Verdict, judgement.WorstUse, judgement.WorstCriterion, true),
            new([0.05, 0.72, -0.25, -3.04, 0.95, 3.44], "shoulder front, elbow up, wrist flipped", Verdict.Fail, double.PositiveInfinity, Criterion.JointPosition, false),
        ],
        PostureChoice = "Of 2 start postures this one comes least close to a limit.",
        SampleCount = s.Count,
        Period = s.Period,
        CycleTime = (s.Count - 1) * s.Period,
        PlannedTime = (s.Count - 1) * s.Period - 0.41,
        PathLength = 7.214,
        CharacteristicLength = 1,
        Extremes = judgement.Extremes(),
        Remarks = [],
    };

    private RunSamples NewSamples() => new()
    {
        Count = Count,
        JointCount = 6,
        Period = Period,
        ReferenceTime = new double[Count],
        PathFraction = new double[Count],
        Waypoint = new int[Count],
        Process = new bool[Count],
        Joints = _q,
        JointSpeeds = _v,
        JointSpeedDemands = _v,
        JointAccelerationDemands = _a,
        ReferencePosition = Columns(3),
        ReferenceOrientation = Columns(4),
        ToolPosition = Columns(3),
        ToolOrientation = Columns(4),
        TrackingError = new double[Count],
        TurnError = new double[Count],
        AcrossPath = new double[Count],
        StandOff = new double[Count],
        ToolAxisAngle = new double[Count],
        ToolSpeed = new double[Count],
        ReferenceSpeed = new double[Count],
        SigmaMin = new double[Count],
        SigmaMax = new double[Count],
        DampingSquared = new double[Count],
        SpeedScale = new double[Count],
        PathScale = new double[Count],
    };

    private double[][] Columns(int columns) => [.. Enumerable.Range(0, columns).Select(_ => new double[Count])];
}
