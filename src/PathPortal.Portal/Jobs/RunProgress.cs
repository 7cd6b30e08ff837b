using Microsoft.Extensions.Logging;

namespace PathPortal.Portal.Jobs;

/// <summary>
/// Writes a run's progress into its row while it is computed, a few times a second at most, and stops the computation once the run is no
/// longer this worker's. That the database is away for a while stops nothing.
/// </summary>
internal sealed partial class RunProgress(RunClaims claims, TimeProvider clock, ILogger<RunProgress> log)
{
    private static readonly TimeSpan Interval = TimeSpan.FromMilliseconds(400);

    /// <param name="read">How far the computation is, 0..1.</param>
    /// <param name="lost">Cancelled when the run turns out to be somebody else's.</param>
    /// <param name="done">Cancelled by the caller when the computation has ended.</param>
    public async Task FollowAsync(RunClaim claim, Func<double> read, CancellationTokenSource lost, CancellationToken done)
    {
        using var timer = new PeriodicTimer(Interval, clock);
        try
        {
            while (await timer.WaitForNextTickAsync(done))
            {
                try
                {
                    if (!await claims.AdvanceAsync(claim, read(), done))
                    {
                        await lost.CancelAsync();
                        return;
                    }
                }
                catch (Exception e) when (DatabasePatience.IsOutage(e))
                {
                    LogUnwritten(claim.RunId, e.Message);
                }
            }
        }
        catch (OperationCanceledException) when (done.IsCancellationRequested)
        {
            // The computation ended first, as it nearly always does.
        }
    }

    [LoggerMessage(Level = LogLevel.Information, Message = "The progress of run {RunId} could not be written: {Reason}")]
    private partial void LogUnwritten(Guid runId, string reason);
}
