using PathPortal.Portal.Domain;

namespace PathPortal.Portal.Simulation;

/// <summary>The samples of the run a decision rests on, packed for keeping (<see cref="SampleArchive"/>).</summary>
public sealed class DecisionSamples(RunSampleCache cache)
{
    /// <summary>A refusal as in <see cref="RunSampleCache.GetAsync"/>. Takes up to seconds: not inside a transaction.</summary>
    public async Task<Outcome<byte[]>> PackAsync(Guid runId, CancellationToken cancellation = default)
    {
        var run = await cache.GetAsync(runId, cancellation);
        return run.Succeeded ? SampleArchive.Pack(run.Value.Samples) : run.Refusal;
    }
}
