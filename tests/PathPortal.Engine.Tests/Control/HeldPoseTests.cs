using System.Text.Json;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;
using PathPortal.Engine.Tests.Published;

namespace PathPortal.Engine.Tests.Control;

/// <summary>A start that is off by 1 mm along (1, 1, 1) and 0.5° about base z from a pose that is held: how the error dies down, or grows.</summary>
public sealed class HeldPoseTests
{
    // Published: relative to the first value. Where an error has died down to nothing the published runs show their own rounding, 2e-9 rad.
    private const double Relative = 1e-9;
    private const double TurnRounding = 3e-9;

    [Theory]
    [InlineData("RUN-E_initial_error_K10")]
    [InlineData("RUN-E_initial_error_K100")]
    [InlineData("RUN-E_initial_error_K250")]
    [InlineData("RUN-E_initial_error_K400")]
    [InlineData("RUN-E_initial_error_K499")]
    public void Run_InitialError_DecaysAsPublished(string id)
    {
        var published = PublishedCase.Get(id);
        var samples = Run(published);
        foreach (var (k, value) in Values(published, "ep_at_k"))
        {
            Approximately.Equal(value, samples.TrackingError[k], Relative * 1e-3 + Relative * value, $"{published.Source} position error at {k} (m)");
        }

        foreach (var (k, value) in Values(published, "eo_at_k"))
        {
            Approximately.Equal(value, samples.TurnError[k], Relative * 0.0087 + TurnRounding, $"{published.Source} orientation error at {k} (rad)");
        }
    }

    [Fact]
    public void Run_GainBeyondStability_Grows()
    {
        var published = PublishedCase.Get("RUN-E_initial_error_K510");
        var samples = Run(published);
        Assert.True(samples.TurnError[50] > 5 * samples.TurnError[0], $"{published.Source}: {samples.TurnError[50]}");
    }

    private static IEnumerable<(int Step, double Value)> Values(PublishedCase published, string name) => published.Expected.GetProperty(name)
        .EnumerateObject().Select(p => (int.Parse(p.Name, System.Globalization.CultureInfo.InvariantCulture), p.Value.GetDouble()));

    private static RunSamples Run(PublishedCase published)
    {
        var gain = published.InputNumber("K");
        var X_BT = LoopScenarios.ToolPose(LoopScenarios.SquareStart, LoopScenarios.BentTool);
        var turn = RotationVector.ToMatrix(new(0, 0, 0.5 * Math.PI / 180));
        var held = LoopScenarios.Point(
            X_BT.Translation + (1e-3 / Math.Sqrt(3)) * new Vector3D(1, 1, 1), UnitQuaternion.FromMatrix(turn * X_BT.Rotation));
        return LoopScenarios.Run(LoopScenarios.Scenario(
            LoopScenarios.SquareStart,
            LoopScenarios.BentTool,
            LoopScenarios.Controller with { PositionGain = gain, OrientationGain = gain },
            [held with { Dwell = 0.24 }, held]));
    }
}
