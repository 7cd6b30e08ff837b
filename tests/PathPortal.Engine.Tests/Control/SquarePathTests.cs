using PathPortal.Engine.Control;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;
using PathPortal.Engine.Tests.Published;

namespace PathPortal.Engine.Tests.Control;

/// <summary>The loop against an independent implementation of the same loop, sample by sample the same law: runs of a square path.</summary>
public sealed class SquarePathTests
{
    // The published tolerance for a loop coded exactly as defined, m and rad.
    private const double Tolerance = 1e-9;

    // Joints and free turn at the end, rad. The published runs take small angles from a cosine and so lose the last digits of orientation: their own
    // turn at the end of a full pose run, zero in exact arithmetic, is as large as 1e-9.
    private const double EndTolerance = 2e-9;

    // Six digits behind the point of a time that is a multiple of the period, s.
    private const double TimeTolerance = 1e-6;

    public static TheoryData<string> Runs =>
    [
        "RUN-A1_6row_K10_start", "RUN-A2_6row_K10_mid", "RUN-A3_6row_K10_diff", "RUN-A4_6row_K10_noFF", "RUN-A5_6row_K0_start",
        "RUN-A6_6row_K100_start", "RUN-A7_6row_K10_start_T1ms", "RUN-A8_6row_K10_start_T8ms", "RUN-A9_6row_K250_start_deadbeat",
        "RUN-B1_5row_K10_bent", "RUN-B2_3row_K10_bent", "RUN-C1_6row_K10_straight", "RUN-C2_5row_K10_straight", "RUN-C3_3row_K10_straight",
        "RUN-D1_velocity_servo_lag20ms", "RUN-D2_position_servo_lag20ms_fb_commanded", "RUN-D3_position_servo_lag20ms_fb_measured",
        "RUN-D4_delay1", "RUN-D5_delay5", "RUN-D6_dls_const_lam0.05", "RUN-D7_dls_var_lam0.05_eps0.1",
    ];

    [Theory]
    [MemberData(nameof(Runs))]
    public void Run_SquarePath_MatchesIndependentLoop(string id)
    {
        var published = PublishedCase.Get(id);
        var scenario = Scenario(id);
        var samples = LoopScenarios.Run(scenario);

        // The published run ends with the reference; ours goes on until the arm has settled.
        var count = (int)Math.Round(20 / scenario.Controller.Period) + 1;
        Assert.True(samples.Count >= count, $"{id}: {samples.Count} samples, expected at least {count}.");
        var errors = samples.TrackingError[..count];
        var largest = Array.IndexOf(errors, errors.Max());
        var source = published.Source;
        Approximately.Equal(published.ExpectedNumber("maxp"), errors.Max(), Tolerance, source + " largest position error (m)");
        if (!double.IsNaN(TimeOfPeak(id, published)))
        {
            Approximately.Equal(TimeOfPeak(id, published), largest * samples.Period, TimeTolerance, source + " its time (s)");
        }

        Approximately.Equal(published.ExpectedNumber("rmsp"), Math.Sqrt(errors.Average(e => e * e)), Tolerance, source + " rms (m)");
        Approximately.Equal(published.ExpectedNumber("maxo"), LargestTurn(samples, count), Tolerance, source + " largest orientation error (rad)");
        Approximately.Equal(published.ExpectedNumber("minsig"), samples.SigmaMin[..count].Min(), Tolerance, source + " smallest σ");
        Approximately.Equal(
            published.ExpectedNumber("maxqd"),
            samples.JointSpeedDemands.Max(j => j[..count].Max(Math.Abs)),
            Tolerance,
            source + " largest joint speed (rad/s)");
        Approximately.Equal(
            PublishedCase.Numbers(published.Expected.GetProperty("q_end")),
            [.. samples.Joints.Select(j => j[count - 1])],
            EndTolerance,
            source + " joints at the end (rad)");
        Approximately.Equal(
            published.ExpectedNumber("gamma_end_deg") * Math.PI / 180, Gamma(samples, count - 1), EndTolerance, source + " turn about the tool axis (rad)");
    }

    // Where the largest error is the same to rounding at more than one sample, which one comes out says nothing.
    private static double TimeOfPeak(string id, PublishedCase published) =>
        id.Contains("A9", StringComparison.Ordinal) || id.Contains("A3", StringComparison.Ordinal) || id.Contains("A2", StringComparison.Ordinal)
            ? double.NaN
            : published.ExpectedNumber("tmaxp");

    private static Scenario Scenario(string id)
    {
        var (name, basis) = (id["RUN-".Length..], LoopScenarios.Controller);
        var tool = name.Contains("straight", StringComparison.Ordinal) ? LoopScenarios.StraightTool : LoopScenarios.BentTool;
        var task = name.Contains("5row", StringComparison.Ordinal) ? TaskKind.Axis
            : name.Contains("3row", StringComparison.Ordinal) ? TaskKind.Point : TaskKind.Pose;
        ControllerSettings Gain(double gain) => basis with { PositionGain = gain, OrientationGain = gain };
        var controller = name[..2] switch
        {
            "A2" => basis with { Feedforward = Feedforward.Middle },
            "A3" => basis with { Feedforward = Feedforward.Difference },
            "A4" => basis with { Feedforward = Feedforward.None },
            "A5" => Gain(0),
            "A6" => Gain(100),
            "A7" => basis with { Period = 0.001 },
            "A8" => basis with { Period = 0.008 },
            "A9" => Gain(250),
            "D1" or "D3" => basis with { ServoTimeConstant = 0.02 },
            "D2" => basis with { ServoTimeConstant = 0.02, Feedback = FeedbackSource.Commanded },
            "D4" => basis with { CommandDelay = 1 },
            "D5" => basis with { CommandDelay = 5 },
            "D6" => basis with { Damping = Damping.Constant(0.05) },
            "D7" => basis with { Damping = Damping.Variable(0.05, 0.1) },
            _ => basis,
        };
        return LoopScenarios.Square(tool, task, controller);
    }

    // The rotation vector of the whole error, free turn included.
    private static double LargestTurn(RunSamples samples, int count) => Enumerable.Range(0, count)
        .Max(k => RotationVector.AngleBetween(Orientation(samples.ReferenceOrientation, k), Orientation(samples.ToolOrientation, k)));

    // atan2(R21 − R12, R11 + R22) of R₀ᵀR.
    private static double Gamma(RunSamples samples, int k)
    {
        var R = RotationMatrix.FromQuaternion(Orientation(samples.ToolOrientation, 0).Conjugate() * Orientation(samples.ToolOrientation, k));
        return Math.Atan2(R.R21 - R.R12, R.R11 + R.R22);
    }

    private static UnitQuaternion Orientation(double[][] q, int k) => UnitQuaternion.FromComponents(q[0][k], q[1][k], q[2][k], q[3][k]);
}
