using System.Collections.Immutable;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Control;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;
using PathPortal.Engine.Tests.Published;

namespace PathPortal.Engine.Tests.Control;

/// <summary>
/// Closed forms of the loop of gain, lag and delay, exact on an arm of three crossed slides. The tool moves along x; long ramps have died down to the
/// steady error where it is read.
/// </summary>
public sealed class GantryLoopTests
{
    // Published tolerance of the closed forms (m); the transient left at the place of reading is below 1e-12 m.
    private const double Tolerance = 1e-9;

    private static readonly ControllerSettings Basis = LoopScenarios.Controller with { TimeLaw = TimeLaw.Trapezoidal, ToolAcceleration = 0.024 };

    [Fact]
    public void Run_RampWithoutFeedforward_TrailsBySpeedOverGain()
    {
        var published = PublishedCase.Get("CLIK-03");
        var error = AtCruise(Basis with { Feedforward = Feedforward.None });
        Approximately.Equal(published.ExpectedNumber("e_ss"), error, Tolerance, published.Source);
    }

    [Theory]
    [InlineData(Feedforward.Start, "e_ss_start")]
    [InlineData(Feedforward.Middle, "e_ss_mid")]
    [InlineData(Feedforward.Difference, "e_ss_diff")]
    public void Run_ConstantAcceleration_LeavesWhatFeedforwardMisses(Feedforward feedforward, string expected)
    {
        var published = PublishedCase.Get("CLIK-04");
        Approximately.Equal(
            published.ExpectedNumber(expected), AtAcceleration(Basis with { Feedforward = feedforward }), Tolerance, published.Source);
    }

    [Theory]
    [InlineData(Feedforward.Start, FeedbackSource.Measured, "ramp_ff_measured")]
    [InlineData(Feedforward.Start, FeedbackSource.Commanded, "ramp_ff_commanded")]
    [InlineData(Feedforward.None, FeedbackSource.Measured, "ramp_noff_measured")]
    [InlineData(Feedforward.None, FeedbackSource.Commanded, "ramp_noff_commanded")]
    public void Run_ServoLagOnRamp_MatchesClosedForm(Feedforward feedforward, FeedbackSource feedback, string expected)
    {
        var published = PublishedCase.Get("CLIK-05");
        var controller = Basis with { ServoTimeConstant = published.InputNumber("tau"), Feedforward = feedforward, Feedback = feedback };
        Approximately.Equal(published.ExpectedNumber(expected), AtCruise(controller), Tolerance, published.Source + " " + expected);
    }

    [Fact]
    public void Run_ServoLagUnderAcceleration_MatchesClosedForm()
    {
        var published = PublishedCase.Get("CLIK-05");
        var error = AtAcceleration(Basis with { ServoTimeConstant = published.InputNumber("tau") });
        Approximately.Equal(published.ExpectedNumber("accel_ff_measured"), error, Tolerance, published.Source);
    }

    [Fact]
    public void Run_Delays_MatchClosedForms()
    {
        var published = PublishedCase.Get("CLIK-08");
        var delay = (int)published.InputNumber("delay_samples");
        Approximately.Equal(
            published.ExpectedNumber("cmd_delay_ramp"), AtCruise(Basis with { CommandDelay = delay }), Tolerance, published.Source + " command, ramp");
        Approximately.Equal(
            published.ExpectedNumber("cmd_delay_accel"),
            AtAcceleration(Basis with { CommandDelay = delay }),
            Tolerance,
            published.Source + " command, acceleration");

        // The arm leads: the published error is negative, ours is a distance; the sign shows in the position.
        Approximately.Equal(
            -published.ExpectedNumber("meas_delay_ramp"),
            AtCruise(Basis with { MeasurementDelay = delay }),
            Tolerance,
            published.Source + " measurement, ramp");
        Approximately.Equal(
            published.ExpectedNumber("meas_delay_ramp_noff"),
            AtCruise(Basis with { MeasurementDelay = delay, Feedforward = Feedforward.None }),
            Tolerance,
            published.Source + " measurement, no feedforward");
    }

    [Fact]
    public void Run_MeasurementDelay_ArmLeads()
    {
        var samples = Run(Basis with { MeasurementDelay = 5 }, 0.03);
        var k = samples.Count / 2;
        Assert.True(samples.ToolPosition[0][k] > samples.ReferencePosition[0][k]);
    }

    [Fact]
    public void Run_LagOnStraightLine_IsNoPathDeviation()
    {
        var published = PublishedCase.Get("CLIK-11");
        var samples = Run(Basis with { Feedforward = Feedforward.None }, 0.03);
        var k = samples.Count / 2;
        Approximately.Equal(published.ExpectedNumber("equal_time_error"), samples.TrackingError[k], Tolerance, published.Source);
        Approximately.Equal(published.ExpectedNumber("distance_to_path"), samples.AcrossPath[k], Tolerance, published.Source);
    }

    [Fact]
    public void Run_InitialError_ShrinksByOneMinusGainTimesPeriod()
    {
        var published = PublishedCase.Get("CLIK-02");
        foreach (var row in PublishedCase.Matrix(Rows(published)))
        {
            var (gain, ratio) = (row[0], row[2]);
            var held = Point(0, 0.03);
            var scenario = Scenario([held with { Dwell = 0.2 }, held], Basis with { PositionGain = gain, OrientationGain = gain }, [0.001, 0, 0]);
            var samples = LoopScenarios.Run(scenario);
            for (var k = 1; k <= 10; k++)
            {
                // Published tolerance, relative to the first error.
                Approximately.Equal(Math.Abs(Math.Pow(ratio, k)) * 0.001, samples.TrackingError[k], 1e-12 * 0.001 * Math.Max(1, Math.Pow(Math.Abs(ratio), k)) + 1e-17, $"{published.Source} K {gain}, step {k}");
            }
        }
    }

    // The last column of the published rows is a word.
    private static System.Text.Json.JsonElement Rows(PublishedCase published) => System.Text.Json.JsonSerializer.SerializeToElement(
        published.Expected.GetProperty("rows").EnumerateArray().Select(row => row.EnumerateArray().Take(4).Select(v => v.GetDouble()).ToArray()).ToArray());

    // In the middle of 10 s at 30 mm/s.
    private static double AtCruise(ControllerSettings controller)
    {
        var samples = Run(controller, 0.03);
        return samples.TrackingError[samples.Count / 2];
    }

    // After 4 s of an acceleration that takes 5 s.
    private static double AtAcceleration(ControllerSettings controller) => Run(controller, 0.12).TrackingError[1000];

    private static RunSamples Run(ControllerSettings controller, double speed) =>
        LoopScenarios.Run(Scenario([Point(0, speed), Point(0.6, speed)], controller, [0, 0, 0]));

    private static Waypoint Point(double x, double speed) =>
        LoopScenarios.Point(new(x, 0, 0), UnitQuaternion.Identity) with { Speed = speed, Task = TaskKind.Point, ProcessOn = true };

    private static Scenario Scenario(ImmutableArray<Waypoint> waypoints, ControllerSettings controller, ImmutableArray<double> start) =>
        LoopScenarios.Scenario(start, RigidTransform.Identity, controller, waypoints) with { Arm = Gantry() };

    private static ArmModel Gantry()
    {
        ChainLink Slide(string name, Vector3D axis) =>
            ChainLink.AboutAxis(name, JointKind.Prismatic, RigidTransform.Identity, axis, 1, 0, new());
        return ChainLink.ToArm(
            "three slides", [Slide("x", Vector3D.UnitX), Slide("y", Vector3D.UnitY), Slide("z", Vector3D.UnitZ)], RigidTransform.Identity, 1);
    }
}
