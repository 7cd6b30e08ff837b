using PathPortal.Engine.Control;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Tests.Published;

namespace PathPortal.Engine.Tests.Control;

public sealed class LoopSoundnessTests
{
    private static readonly ControllerSettings Basis = LoopScenarios.Controller;

    [Fact]
    public void GainLimit_PureDelay_MatchesPublishedLimits()
    {
        var published = PublishedCase.Get("CLIK-07");
        foreach (var row in PublishedCase.Matrix(published.Expected.GetProperty("rows")))
        {
            var delay = (int)row[0];
            for (var measured = 0; measured <= delay; measured++)
            {
                var limit = LoopSoundness.GainLimit(Basis with { MeasurementDelay = measured, CommandDelay = delay - measured });

                // Published 1e-12; sixty halvings of half a turn leave 3e-18.
                Approximately.Equal(row[1], limit * Basis.Period, 1e-12, $"{published.Source} d = {delay}");
            }
        }
    }

    [Fact]
    public void GainLimit_ServoLag_MatchesJuryLimit()
    {
        var published = PublishedCase.Get("CLIK-06");
        var controller = Basis with { Period = published.InputNumber("T"), ServoTimeConstant = published.InputNumber("tau") };

        // Published to 1e-9 relative: b₀ loses digits where lag is long against the period.
        var expected = published.ExpectedNumber("K_limit");
        Approximately.Equal(expected, LoopSoundness.GainLimit(controller), 1e-9 * expected, published.Source);
    }

    [Fact]
    public void GainLimit_CommandedFeedback_SeesNeitherLagNorDelay()
    {
        var controller = Basis with { Feedback = FeedbackSource.Commanded, ServoTimeConstant = 0.05, CommandDelay = 3 };

        // CLIK-02: K T < 2.
        Approximately.Equal(2 / controller.Period, LoopSoundness.GainLimit(controller), 1e-9, "limit (1/s)");
    }

    [Theory]
    [InlineData(249, true)]
    [InlineData(251, false)]
    public void Judge_GainAroundHalfTheLimit_AsksForMarginOfTwo(double gain, bool sound)
    {
        var (isSound, reason) = LoopSoundness.Judge(Basis with { OrientationGain = gain });
        Assert.Equal(sound, isSound);
        Assert.Equal(sound, reason is null);
    }

    [Fact]
    public void Run_GainJustBelowAndAboveLimit_DiesDownAndGrows()
    {
        // The sampled loop itself is the second route to its own limit: lag and delay together, for which there is no closed form.
        var controller = Basis with { ServoTimeConstant = 0.01, MeasurementDelay = 1, CommandDelay = 1 };
        var limit = LoopSoundness.GainLimit(controller);
        Assert.True(Growth(controller, 0.97 * limit) < 1);
        Assert.True(Growth(controller, 1.03 * limit) > 1);
    }

    private static double Growth(ControllerSettings controller, double gain)
    {
        var pose = LoopScenarios.ToolPose(LoopScenarios.SquareStart, LoopScenarios.BentTool);
        var held = LoopScenarios.Point(
            pose.Translation + new Vector3D(1e-7, 0, 0), UnitQuaternion.FromMatrix(pose.Rotation)) with
        { Dwell = 2 };
        var samples = LoopScenarios.Run(LoopScenarios.Scenario(
            LoopScenarios.SquareStart,
            LoopScenarios.BentTool,
            controller with { PositionGain = gain, OrientationGain = gain },
            [held, held with { Dwell = 0 }]));
        return samples.TrackingError[350..450].Max() / samples.TrackingError[150..250].Max();
    }
}
