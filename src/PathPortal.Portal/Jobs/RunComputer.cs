using Microsoft.Extensions.Logging;
using PathPortal.Engine;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain.Runs;
using PathPortal.Portal.Simulation;

namespace PathPortal.Portal.Jobs;

/// <summary>Computes one run: takes it, builds its scenario from the frozen inputs, simulates, keeps the result.</summary>
internal sealed partial class RunComputer(
    PortalDb db, RunClaims claims, RunProgress progress, DatabasePatience patience, WorkerIdentity worker, ILogger<RunComputer> log)
{
    /// <param name="ownerLost">As in <see cref="RunClaims.TakeAsync"/>.</param>
    /// <param name="stop">Cancelled when the worker must end; the run then stays as it is, for the caller to give back.</param>
    public async Task ComputeAsync(Guid runId, Guid batchId, bool ownerLost, CancellationToken stop)
    {
        var claim = await patience.TryAsync(() => claims.TakeAsync(runId, batchId, ownerLost, stop), stop);
        if (claim is null)
            return;
        using var lost = CancellationTokenSource.CreateLinkedTokenSource(stop);
        try
        {
            var inputs = await patience.TryAsync(() => ReadAsync(runId, stop), stop);
            var scenario = inputs?.Build();
            if (scenario is not { Ok: true })
            {
                await FailAsync(claim, scenario?.ProblemText ?? "Nothing says what this run was to be computed from.", stop);
                return;
            }
            var conclusion = await SimulateAsync(claim, scenario.Scenario, lost);
            // A result that is there is worth the wait, even when the worker is about to end.
            var kept = await patience.TryAsync(() => claims.CompleteAsync(claim, conclusion, CancellationToken.None), stop);
            LogDone(runId, claim.Attempt, conclusion.Verdict, kept);
        }
        catch (OperationCanceledException) when (lost.IsCancellationRequested)
        {
            LogGivenUp(runId, claim.Attempt, stop.IsCancellationRequested ? "this worker stops" : "another worker has it");
        }
        catch (Exception e) when (e is not OutOfMemoryException && !DatabasePatience.IsOutage(e))
        {
            LogFailed(e, runId, claim.Attempt);
            await FailAsync(claim, $"The simulation stopped with an error that should not happen: {e.Message} The log of worker {worker.Name} has the details.", stop);
        }
    }

    private Task<RunInputs?> ReadAsync(Guid runId, CancellationToken cancellation) =>
        db.ReadAsync(Actor.Process("worker " + worker.Name), session => RunInputsQuery.ReadAsync(session, runId, cancellation), cancellation);

    private async Task<RunConclusion> SimulateAsync(RunClaim claim, Scenario scenario, CancellationTokenSource lost)
    {
        var latest = new LatestProgress();
        using var done = CancellationTokenSource.CreateLinkedTokenSource(lost.Token);
        var follow = progress.FollowAsync(claim, () => latest.Value, lost, done.Token);
        try
        {
            return await Task.Run(() => RunConclusions.Of(Simulator.Run(scenario, keepSamples: false, latest, lost.Token)), lost.Token);
        }
        finally
        {
            await done.CancelAsync();
            await follow;
        }
    }

    private async Task FailAsync(RunClaim claim, string error, CancellationToken stop)
    {
        var kept = await patience.TryAsync(() => claims.FailAsync(claim, error, CancellationToken.None), stop);
        LogNoResult(claim.RunId, claim.Attempt, error, kept);
    }

    [LoggerMessage(Level = LogLevel.Information, Message = "Run {RunId}, attempt {Attempt}: {Verdict}, kept: {Kept}")]
    private partial void LogDone(Guid runId, int attempt, Engine.Verdicts.Verdict verdict, bool kept);

    [LoggerMessage(Level = LogLevel.Information, Message = "Run {RunId}, attempt {Attempt} given up: {Reason}")]
    private partial void LogGivenUp(Guid runId, int attempt, string reason);

    [LoggerMessage(Level = LogLevel.Warning, Message = "Run {RunId}, attempt {Attempt} has no result: {Error} Kept: {Kept}")]
    private partial void LogNoResult(Guid runId, int attempt, string error, bool kept);

    [LoggerMessage(Level = LogLevel.Error, Message = "Run {RunId}, attempt {Attempt} failed")]
    private partial void LogFailed(Exception exception, Guid runId, int attempt);
}
