using Microsoft.Extensions.Logging;
using Quartz;

namespace PathPortal.Portal.Jobs;

/// <summary>
/// Computes the runs of one batch, one after the other. May be started twice for a batch, on two workers, at any moment: what a run's row
/// says decides, and a run that has a result is never computed again.
/// </summary>
internal sealed partial class SimulateRunsJob(
    RunClaims claims, RunComputer computer, RunReconciler reconciler, DatabasePatience patience, WorkerStop stop, ILogger<SimulateRunsJob> log) : IJob
{
    public async ValueTask Execute(IJobExecutionContext context, CancellationToken cancellationToken = default)
    {
        stop.JobBegins();
        try
        {
            await ComputeAsync(Guid.ParseExact(context.JobDetail.Key.Name, "N"), context.Recovering);
        }
        finally
        {
            stop.JobEnds();
        }
    }

    private async Task ComputeAsync(Guid batch, bool recovering)
    {
        var left = new Queue<Guid>(await patience.TryAsync(() => claims.OfBatchAsync(batch, stop.Now), stop.Now));
        LogStarted(batch, left.Count, recovering);
        while (!stop.NoMore.IsCancellationRequested && left.TryDequeue(out var run))
            await computer.ComputeAsync(run, batch, recovering, stop.Now);
        if (stop.NoMore.IsCancellationRequested)
        {
            var runs = await reconciler.GiveBackAsync(batch, CancellationToken.None);
            LogGivenBack(batch, runs);
        }
    }

    [LoggerMessage(Level = LogLevel.Information, Message = "Batch {BatchId} of {Runs} runs, taken over: {Recovering}")]
    private partial void LogStarted(Guid batchId, int runs, bool recovering);

    [LoggerMessage(Level = LogLevel.Information, Message = "Batch {BatchId}: {Runs} runs given back")]
    private partial void LogGivenBack(Guid batchId, int runs);
}
