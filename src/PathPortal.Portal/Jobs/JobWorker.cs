using Microsoft.Extensions.Hosting;
using Microsoft.Extensions.Logging;
using PathPortal.Portal.Data;
using Quartz;

namespace PathPortal.Portal.Jobs;

/// <summary>
/// The life of a worker process: waits for the database to be current, takes jobs, says that it is alive, puts right what was orphaned, and
/// ends in good order. The database may go away and come back at any time.
/// </summary>
internal sealed partial class JobWorker(
    PortalSchema schema, JobWorkerParts parts, ISchedulerFactory schedulers, WorkerIdentity worker, TimeProvider clock,
    ILogger<JobWorker> log) : BackgroundService
{
    private static readonly TimeSpan SchemaInterval = TimeSpan.FromSeconds(2);
    private static readonly TimeSpan ReconcileInterval = TimeSpan.FromMinutes(1);
    private static readonly TimeSpan IdleInterval = TimeSpan.FromMilliseconds(50);

    protected override async Task ExecuteAsync(CancellationToken stoppingToken)
    {
        IScheduler? scheduler = null;
        try
        {
            await WaitForSchemaAsync(stoppingToken);
            LogReady(worker.Name);
            var beats = EveryAsync(WorkerHeartbeat.Interval, "heartbeat", parts.Heartbeat.BeatAsync, stoppingToken);
            scheduler = await StartSchedulerAsync(stoppingToken);
            var reconciles = EveryAsync(ReconcileInterval, "reconciler", parts.Reconciler.RunAsync, stoppingToken);
            await Task.WhenAll(beats, reconciles);
        }
        catch (OperationCanceledException) when (stoppingToken.IsCancellationRequested)
        {
            // The process was asked to end.
        }
        await EndAsync(scheduler);
    }

    private async Task WaitForSchemaAsync(CancellationToken cancellation)
    {
        string? told = null;
        while (await schema.WhyNotReadyAsync(cancellation) is { } reason)
        {
            if (reason != told)
                LogNotReady(reason);
            told = reason;
            await Task.Delay(SchemaInterval, clock, cancellation);
        }
    }

    private async Task<IScheduler> StartSchedulerAsync(CancellationToken cancellation)
    {
        string? told = null;
        while (true)
        {
            try
            {
                var scheduler = await schedulers.GetScheduler(cancellation);
                await scheduler.Start(cancellation);
                return scheduler;
            }
            catch (SchedulerException e)
            {
                var reason = e.GetBaseException().Message;
                if (reason != told)
                    LogNotReady(reason);
                told = reason;
            }
            await Task.Delay(SchemaInterval, clock, cancellation);
        }
    }

    /// <summary>Does something now and then, whatever becomes of it, until the process ends.</summary>
    private async Task EveryAsync(TimeSpan interval, string what, Func<CancellationToken, Task> act, CancellationToken stop)
    {
        using var timer = new PeriodicTimer(interval, clock);
        do
        {
            try
            {
                await act(stop);
            }
            catch (Exception e) when (!stop.IsCancellationRequested)
            {
                if (DatabasePatience.IsOutage(e))
                    LogOutage(what, e.GetBaseException().Message);
                else
                    LogTrouble(e, what);
            }
        }
        while (await timer.WaitForNextTickAsync(stop));
    }

    private async Task EndAsync(IScheduler? scheduler)
    {
        LogStopping(worker.Name);
        parts.Stop.TakeNoMore();
        using var end = new CancellationTokenSource(parts.Options.StopPatience, clock);
        await using var giveUp = end.Token.Register(parts.Stop.GiveUp);
        try
        {
            if (scheduler is not null)
            {
                // A job gives back what it did not come to by way of the scheduler, which must not be shut down before.
                await scheduler.Standby(CancellationToken.None);
                while (parts.Stop.IsBusy)
                    await Task.Delay(IdleInterval, clock);
                await scheduler.Shutdown(waitForJobsToComplete: true, CancellationToken.None);
            }
            using var soon = new CancellationTokenSource(TimeSpan.FromSeconds(2), clock);
            await parts.Heartbeat.EndAsync(soon.Token);
        }
        catch (Exception e)
        {
            LogRoughEnd(e.GetBaseException().Message);
        }
        LogStopped(worker.Name);
    }

    [LoggerMessage(Level = LogLevel.Warning, Message = "Waiting: {Reason}")]
    private partial void LogNotReady(string reason);

    [LoggerMessage(Level = LogLevel.Information, Message = "Worker {Worker} is ready")]
    private partial void LogReady(string worker);

    [LoggerMessage(Level = LogLevel.Warning, Message = "The {What} could not reach the database: {Reason}")]
    private partial void LogOutage(string what, string reason);

    [LoggerMessage(Level = LogLevel.Error, Message = "The {What} failed and will be tried again")]
    private partial void LogTrouble(Exception exception, string what);

    [LoggerMessage(Level = LogLevel.Information, Message = "Worker {Worker} takes no more work")]
    private partial void LogStopping(string worker);

    [LoggerMessage(Level = LogLevel.Warning, Message = "The end was not in good order; the other workers will take over: {Reason}")]
    private partial void LogRoughEnd(string reason);

    [LoggerMessage(Level = LogLevel.Information, Message = "Worker {Worker} ends")]
    private partial void LogStopped(string worker);
}
