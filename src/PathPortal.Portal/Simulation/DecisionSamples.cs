using Microsoft.EntityFrameworkCore;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain;

namespace PathPortal.Portal.Simulation;

/// <summary>The samples of the run a decision rests on, packed for keeping (<see cref="SampleArchive"/>).</summary>
public sealed class DecisionSamples(PortalDb db, RunSampleCache cache)
{
    private static readonly byte[] None = [];

    /// <summary>
    /// Empty for a run that could not start and so has none. A refusal as in <see cref="RunSampleCache.GetAsync"/>. Takes up to seconds: not
    /// inside a transaction.
    /// </summary>
    public async Task<Outcome<byte[]>> PackAsync(Guid runId, CancellationToken cancellation = default)
    {
        var hasSamples = await db.ReadAsync(
            Actor.Process("samples"), s => s.Db.Runs.AnyAsync(r => r.Id == runId && r.Bins != null, cancellation), cancellation);
        if (!hasSamples)
            return None;
        var run = await cache.GetAsync(runId, cancellation);
        return run.Succeeded ? SampleArchive.Pack(run.Value.Samples) : run.Refusal;
    }
}
