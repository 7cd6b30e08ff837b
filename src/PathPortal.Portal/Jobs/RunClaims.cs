using Microsoft.EntityFrameworkCore;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.Runs;

namespace PathPortal.Portal.Jobs;

/// <summary>
/// Takes runs for this worker and writes what becomes of them. A lease excludes nobody, because a frozen worker does not know that its own
/// has ended; so every write names the attempt it belongs to, and one that was overtaken changes nothing.
/// </summary>
internal sealed class RunClaims(PortalDb db, WorkerIdentity worker)
{
    private readonly Actor _actor = Actor.Process("worker " + worker.Name);

    /// <summary>The runs of a batch that are still to be computed, oldest first.</summary>
    public Task<List<Guid>> OfBatchAsync(Guid batchId, CancellationToken cancellation) =>
        db.ReadAsync(
            _actor,
            session => session.Db.Runs
                .Where(r => r.BatchId == batchId && (r.State == RunState.Queued || r.State == RunState.Running))
                .OrderBy(r => r.QueuedAt).ThenBy(r => r.Id)
                .Select(r => r.Id)
                .ToListAsync(cancellation),
            cancellation);

    /// <summary>
    /// Takes a run; null when it is not to be had: finished, given to another job, or at work on a worker that is alive. A run that took its
    /// workers down too often is given up here.
    /// </summary>
    /// <param name="ownerLost">True when the job engine says that the worker that had the job is gone.</param>
    public async Task<RunClaim?> TakeAsync(Guid runId, Guid batchId, bool ownerLost, CancellationToken cancellation)
    {
        var taken = await db.ActAsync<Taken>(
            _actor,
            async session =>
            {
                var run = await LockAsync(session, runId, cancellation);
                if (run is null || run.IsFinished || run.BatchId != batchId)
                    return new Taken(null);
                if (run.State == RunState.Running && !ownerLost && await IsAliveAsync(session, run.WorkerName, cancellation))
                    return new Taken(null);
                if (run.Attempts >= Run.MaxAttempts)
                {
                    run.Fail($"{run.Attempts} workers stopped while they computed this run, the last one {run.WorkerName}. Their logs say why.", session.Now);
                    return new Taken(null);
                }
                run.Start(worker.Name, session.Now);
                return new Taken(new(run.Id, run.Attempts));
            },
            cancellation);
        return taken.Value.Claim;
    }

    /// <summary>Notes how far the run is; false when it is no longer this worker's.</summary>
    public async Task<bool> AdvanceAsync(RunClaim claim, double progress, CancellationToken cancellation)
    {
        await using var session = await db.OpenAsync(_actor, cancellation);
        var rows = await Held(session, claim)
            .ExecuteUpdateAsync(set => set.SetProperty(r => r.Progress, r => progress > r.Progress ? progress : r.Progress), cancellation);
        await session.CommitAsync(cancellation);
        return rows == 1;
    }

    /// <summary>Keeps a result; false when the run is no longer this worker's.</summary>
    public Task<bool> CompleteAsync(RunClaim claim, RunConclusion conclusion, CancellationToken cancellation) =>
        ChangeAsync(claim, (run, now) => run.Complete(conclusion, now), cancellation);

    /// <summary>Gives up on a run that can't be computed; false when it is no longer this worker's.</summary>
    public Task<bool> FailAsync(RunClaim claim, string error, CancellationToken cancellation) =>
        ChangeAsync(claim, (run, now) => run.Fail(error, now), cancellation);

    private async Task<bool> ChangeAsync(RunClaim claim, Action<Run, DateTimeOffset> change, CancellationToken cancellation)
    {
        var changed = await db.ActAsync<RunClaim>(
            _actor,
            async session =>
            {
                var run = await LockAsync(session, claim.RunId, cancellation);
                if (run is not { State: RunState.Running } || run.Attempts != claim.Attempt || run.WorkerName != worker.Name)
                    return Refusal.NotFound("run");
                change(run, session.Now);
                return claim;
            },
            cancellation);
        return changed.Succeeded;
    }

    private IQueryable<Run> Held(PortalSession session, RunClaim claim) => session.Db.Runs.Where(
        r => r.Id == claim.RunId && r.State == RunState.Running && r.Attempts == claim.Attempt && r.WorkerName == worker.Name);

    private static Task<Run?> LockAsync(PortalSession session, Guid runId, CancellationToken cancellation) =>
        session.Db.Runs.FromSql($"SELECT r.*, r.xmin FROM runs r WHERE r.id = {runId} FOR UPDATE").SingleOrDefaultAsync(cancellation);

    private static Task<bool> IsAliveAsync(PortalSession session, string? name, CancellationToken cancellation) =>
        session.Db.Workers.AnyAsync(w => w.Name == name && w.LastSeenAt > session.Now - WorkerPresence.Absent, cancellation);

    private sealed record Taken(RunClaim? Claim);
}
