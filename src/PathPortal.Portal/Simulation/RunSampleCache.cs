using Microsoft.EntityFrameworkCore;
using PathPortal.Engine;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.Runs;

namespace PathPortal.Portal.Simulation;

/// <summary>
/// The samples of finished runs, computed again from the frozen inputs when somebody asks, and kept while there is room. What comes out is
/// compared with what the run stored. Several who ask at once share one computation. Whether the asker may see the run is the caller's
/// business. Thread-safe.
/// </summary>
public sealed class RunSampleCache(PortalDb db, RunSampleCacheOptions options) : IDisposable
{
    private static readonly Actor Actor = Actor.Process("samples");

    private readonly SemaphoreSlim _slots = new(options.AtOnce);
    private readonly Lock _lock = new();
    private readonly Dictionary<Guid, LinkedListNode<(RecomputedRun Run, long Size)>> _kept = [];
    private readonly LinkedList<(RecomputedRun Run, long Size)> _newestFirst = [];
    private readonly Dictionary<Guid, Task<Outcome<RecomputedRun>>> _underWay = [];
    private long _size;

    /// <summary>Bytes kept now.</summary>
    public long Size
    {
        get
        {
            lock (_lock)
                return _size;
        }
    }

    /// <summary>A refusal when the run is not finished, too long, or comes out differently. Cancelling ends the waiting, not the computation.</summary>
    public Task<Outcome<RecomputedRun>> GetAsync(Guid runId, CancellationToken cancellation = default)
    {
        Task<Outcome<RecomputedRun>> task;
        lock (_lock)
        {
            if (_kept.TryGetValue(runId, out var node))
            {
                _newestFirst.Remove(node);
                _newestFirst.AddFirst(node);
                return Task.FromResult<Outcome<RecomputedRun>>(node.Value.Run);
            }
            if (!_underWay.TryGetValue(runId, out task!))
            {
                task = Task.Run(() => ComputeAndKeepAsync(runId), CancellationToken.None);
                _underWay.Add(runId, task);
            }
        }
        return task.WaitAsync(cancellation);
    }

    public void Dispose() => _slots.Dispose();

    private async Task<Outcome<RecomputedRun>> ComputeAndKeepAsync(Guid runId)
    {
        try
        {
            var computed = await ComputeAsync(runId);
            if (computed.Succeeded)
                Keep(computed.Value);
            return computed;
        }
        finally
        {
            lock (_lock)
                _underWay.Remove(runId);
        }
    }

    private async Task<Outcome<RecomputedRun>> ComputeAsync(Guid runId)
    {
        var (stored, inputs) = await db.ReadAsync(Actor, async session => (
            await session.Db.Runs.Where(r => r.Id == runId).Select(r => new { r.State, r.Bins, r.SummaryJson }).SingleOrDefaultAsync(),
            await RunInputsQuery.ReadAsync(session, runId)));
        if (stored is null || inputs is null)
            return Refusal.NotFound("run");
        if (stored.State != RunState.Done || stored.SummaryJson is null)
            return new Refusal(RefusalKind.WrongState, "The run has no result yet.");
        if (stored.Bins is null)
            return new Refusal(RefusalKind.WrongState, "The run could not start, so it has no samples.");
        if (RunSummaryJson.Read(stored.SummaryJson).SampleCount > options.MostSamples)
            return new Refusal(RefusalKind.WrongState, $"The run is longer than {options.MostSamples} samples; they are not computed again for a page.");

        await _slots.WaitAsync();
        try
        {
            var built = inputs.Build();
            if (!built.Ok)
                return new Refusal(RefusalKind.Stale, built.ProblemText);
            var result = Simulator.Run(built.Scenario, keepSamples: true);
            if (result.Samples is null || result.Bins is null || !UseBinsCodec.Pack(result.Bins).AsSpan().SequenceEqual(stored.Bins))
            {
                return new Refusal(
                    RefusalKind.Stale,
                    "Computed again, the run does not come out as it was stored. Its samples are not shown, because they would not be those of the verdict.");
            }
            return new RecomputedRun(runId, inputs.Digest, built.Scenario, result.Samples);
        }
        finally
        {
            _slots.Release();
        }
    }

    private void Keep(RecomputedRun run)
    {
        var size = SampleColumns.Size(run.Samples);
        if (size > options.Capacity)
            return;
        lock (_lock)
        {
            if (_kept.ContainsKey(run.RunId))
                return;
            _kept.Add(run.RunId, _newestFirst.AddFirst((run, size)));
            _size += size;
            while (_size > options.Capacity)
            {
                var oldest = _newestFirst.Last!;
                _newestFirst.RemoveLast();
                _kept.Remove(oldest.Value.Run.RunId);
                _size -= oldest.Value.Size;
            }
        }
    }
}
