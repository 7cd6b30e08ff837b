using System.Data.Common;
using System.Diagnostics.CodeAnalysis;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain.Runs;
using Quartz;

namespace PathPortal.Portal.Jobs;

/// <summary>
/// Hands runs to the job engine in the caller's own transaction: either the rows and their jobs are both there, or neither is. Needs no
/// started scheduler. Thread-safe.
/// </summary>
[SuppressMessage("Naming", "CA1711", Justification = "A queue in the sense of the job, not of the collection.")]
public sealed class RunQueue(ISchedulerFactory schedulers)
{
    /// <summary>Runs somebody waits for are spread over this many jobs, so that several workers can share them.</summary>
    private const int InteractiveJobs = 4;

    /// <summary>Runs of one job in a re-check.</summary>
    private const int BulkBatch = 64;

    /// <summary>
    /// Gives the runs to jobs. They must be tracked by the session and still to be computed. Takes effect when the session commits.
    /// </summary>
    public void Enqueue(PortalSession session, IReadOnlyCollection<Run> runs, RunPriority priority)
    {
        if (runs.Count == 0)
            return;
        var size = priority == RunPriority.Bulk ? BulkBatch : (runs.Count + InteractiveJobs - 1) / InteractiveJobs;
        List<Guid> batches = [];
        foreach (var batch in runs.Chunk(size))
        {
            var id = Guid.CreateVersion7(session.Now);
            batches.Add(id);
            foreach (var run in batch)
                run.JoinBatch(id);
        }
        session.BeforeHistory((transaction, cancellation) => ScheduleAsync(transaction, batches, priority, cancellation));
    }

    /// <summary>The name of the job of a batch.</summary>
    internal static string JobName(Guid batchId) => batchId.ToString("N");

    private async Task ScheduleAsync(DbTransaction transaction, List<Guid> batches, RunPriority priority, CancellationToken cancellation)
    {
        var scheduler = await schedulers.GetScheduler(cancellation);
        using var enlisted = scheduler.EnlistTransaction(transaction);
        foreach (var batch in batches)
        {
            var job = JobBuilder.Create<SimulateRunsJob>()
                .WithIdentity(JobName(batch), JobScheduler.RunsGroup)
                .RequestRecovery()
                .Build();
            var trigger = TriggerBuilder.Create()
                .WithIdentity(JobName(batch), JobScheduler.RunsGroup)
                .WithExecutionGroup(JobScheduler.GroupOf(priority))
                .StartNow()
                .Build();
            await scheduler.ScheduleJob(job, trigger, cancellationToken: cancellation);
        }
    }
}
