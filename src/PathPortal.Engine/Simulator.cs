namespace PathPortal.Engine;

/// <summary>Runs one scenario from start to verdict.</summary>
public static class Simulator
{
    /// <summary>Simulates a scenario.</summary>
    /// <param name="scenario">What to simulate; <see cref="ScenarioCheck"/> must find no problem.</param>
    /// <param name="keepSamples">True to get every sample.</param>
    /// <param name="progress">Told the share that is done, 0..1.</param>
    /// <param name="cancellation">Stops the simulation.</param>
    public static RunResult Run(Scenario scenario, bool keepSamples, IProgress<double>? progress = null, CancellationToken cancellation = default) =>
        throw new NotSupportedException("This build can't simulate yet.");
}
