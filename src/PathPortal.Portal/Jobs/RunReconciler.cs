using Microsoft.EntityFrameworkCore;
using Microsoft.Extensions.Logging;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.Runs;
using Quartz;

namespace PathPortal.Portal.Jobs;

/// <summary>
/// Run rows are the truth; jobs are only the way to them. Gives every run that waits without a live job, or runs on a worker that is gone,
/// to a new job.
/// </summary>
internal sealed partial class RunReconciler(
    PortalDb db, RunQueue queue, ISchedulerFactory schedulers, WorkerIdentity worker, ILogger<RunReconciler> log)
{
    /// <summary>Runs put right in one transaction.</summary>
    private const int AtOnce = 500;

    private readonly Actor _actor = Actor.Process("worker " + worker.Name);

    /// <summary>Puts right what is wrong now; says how many runs that were. Several workers may do it at the same time.</summary>
    public async Task<int> RunAsync(CancellationToken cancellation)
    {
        var total = 0;
        List<Guid> abandoned = [];
        while (true)
        {
            var found = await RequeueAsync(OrphansAsync, abandoned, cancellation);
            total += found;
            if (found < AtOnce)
                break;
        }
        if (total > 0)
        {
            LogRequeued(total);
            await RemoveAsync(abandoned, cancellation);
        }
        return total;
    }

    /// <summary>Gives the runs of a batch that this worker did not come to, or gave up, to another job.</summary>
    public Task<int> GiveBackAsync(Guid batchId, CancellationToken cancellation) => RequeueAsync(
        (session, stop) => session.Db.Runs
            .FromSql($"""
                SELECT r.*, r.xmin FROM runs r
                WHERE r.batch_id = {batchId} AND (r.state = 'Queued' OR r.state = 'Running' AND r.worker_name = {worker.Name})
                FOR UPDATE SKIP LOCKED
                """)
            .ToListAsync(stop),
        [], cancellation);

    private async Task<int> RequeueAsync(
        Func<PortalSession, CancellationToken, Task<List<Run>>> find, List<Guid> abandoned, CancellationToken cancellation)
    {
        var done = await db.ActAsync<Requeued>(
            _actor,
            async session =>
            {
                var runs = await find(session, cancellation);
                var left = runs.Select(r => r.BatchId).OfType<Guid>().Distinct().ToArray();
                var ids = runs.Select(r => r.Id).ToArray();
                var awaited = await session.Db.RunRequests
                    .Where(r => r.RunId != null && ids.Contains(r.RunId.Value) && r.RequestedBy != null)
                    .Select(r => r.RunId!.Value).Distinct().ToListAsync(cancellation);
                foreach (var run in runs)
                    run.Requeue(session.Now);
                queue.Enqueue(session, [.. runs.Where(r => awaited.Contains(r.Id))], RunPriority.Interactive);
                queue.Enqueue(session, [.. runs.Where(r => !awaited.Contains(r.Id))], RunPriority.Bulk);
                return new Requeued(runs.Count, left);
            },
            cancellation);
        if (!done.Succeeded)
            return 0;
        abandoned.AddRange(done.Value.Abandoned);
        return done.Value.Runs;
    }

    // A job is alive while it has a trigger that may still fire, or is being executed. The engine itself takes over the jobs of dead workers
    // within seconds; that a worker was not seen for longer is for the case that it could not.
    private static Task<List<Run>> OrphansAsync(PortalSession session, CancellationToken cancellation) => session.Db.Runs
        .FromSql($"""
            SELECT r.*, r.xmin FROM runs r
            WHERE r.state IN ('Queued', 'Running')
                AND (
                    NOT EXISTS (
                        SELECT FROM jobs.qrtz_triggers t
                        WHERE t.sched_name = {JobScheduler.Name} AND t.job_group = {JobScheduler.RunsGroup}
                            AND t.job_name = replace(r.batch_id::text, '-', '') AND t.trigger_state NOT IN ('ERROR', 'COMPLETE'))
                    AND NOT EXISTS (
                        SELECT FROM jobs.qrtz_fired_triggers f
                        WHERE f.sched_name = {JobScheduler.Name} AND f.job_group = {JobScheduler.RunsGroup}
                            AND f.job_name = replace(r.batch_id::text, '-', ''))
                    OR r.state = 'Running'
                        AND r.started_at < {session.Now - WorkerPresence.Absent}
                        AND NOT EXISTS (SELECT FROM workers w WHERE w.name = r.worker_name AND w.last_seen_at > {session.Now - WorkerPresence.Absent}))
            ORDER BY r.queued_at
            LIMIT {AtOnce}
            FOR UPDATE OF r SKIP LOCKED
            """)
        .ToListAsync(cancellation);

    // Jobs whose trigger broke would stay for ever. One that still runs loses nothing, because no run is its own any more.
    private async Task RemoveAsync(List<Guid> abandoned, CancellationToken cancellation)
    {
        var batches = abandoned.Distinct().ToArray();
        var inUse = await db.ReadAsync(
            _actor,
            session => session.Db.Runs
                .Where(r => r.BatchId != null && batches.Contains(r.BatchId.Value) && (r.State == RunState.Queued || r.State == RunState.Running))
                .Select(r => r.BatchId!.Value).Distinct().ToListAsync(cancellation),
            cancellation);
        var scheduler = await schedulers.GetScheduler(cancellation);
        foreach (var batch in batches.Except(inUse))
            await scheduler.DeleteJob(new JobKey(RunQueue.JobName(batch), JobScheduler.RunsGroup), cancellation);
    }

    [LoggerMessage(Level = LogLevel.Warning, Message = "{Count} runs had no job or no living worker and were given to new jobs")]
    private partial void LogRequeued(int count);

    private sealed record Requeued(int Runs, IReadOnlyList<Guid> Abandoned);
}
