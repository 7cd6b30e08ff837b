using Npgsql;
using PathPortal.Portal.Domain.Runs;
using PathPortal.TestSupport;

namespace PathPortal.Portal.Tests.Jobs;

/// <summary>Waiting for what becomes of runs.</summary>
internal static class RunWaits
{
    /// <summary>Points of a path that takes the engine seconds.</summary>
    public const int LongPath = 5_000;

    /// <summary>Far beyond everything that is promised.</summary>
    public static readonly TimeSpan Patience = TimeSpan.FromSeconds(240);

    private static CancellationToken Cancellation => TestContext.Current.CancellationToken;

    /// <summary>So that how long a process takes to start is not counted with what comes after.</summary>
    public static Task PresentAsync(JobScene scene, long workers) => Eventually.TrueAsync(
        "so many workers are present", Patience, async () => workers == (long)(await scene.SqlAsync("SELECT count(*) FROM workers"))!, Cancellation);

    /// <summary>Which of two workers computes the run, and which does not.</summary>
    public static async Task<(WorkerProcess Holder, WorkerProcess Other)> HolderAsync(JobScene scene, Guid run, WorkerProcess one, WorkerProcess another)
    {
        await UnderWayAsync(scene, one, run);
        return (await scene.RunAsync(run)).WorkerName!.Contains(one.NamePart, StringComparison.Ordinal) ? (one, another) : (another, one);
    }

    public static async Task UnderWayAsync(JobScene scene, WorkerProcess worker, Guid run) =>
        await Eventually.TrueAsync(
            "the run is under way\n" + worker.Log, Patience,
            async () => (await scene.RunAsync(run)).State == RunState.Running, Cancellation);

    public static async Task<Run> FinishedAsync(JobScene scene, WorkerProcess worker, Guid id)
    {
        try
        {
            return await Eventually.GetAsync(
                "the run is finished", Patience,
                async () =>
                {
                    try
                    {
                        return await scene.RunAsync(id) is { IsFinished: true } run ? run : null;
                    }
                    catch (NpgsqlException)
                    {
                        return null;
                    }
                },
                Cancellation);
        }
        catch (TimeoutException e)
        {
            throw new TimeoutException(e.Message + "\n" + worker.Log, e);
        }
    }

    public static async Task AllDoneAsync(JobScene scene, WorkerProcess worker)
    {
        foreach (var run in await scene.RunsAsync())
            Assert.Equal(RunState.Done, (await FinishedAsync(scene, worker, run.Id)).State);
    }

    // The engine has no job, trigger or execution left that could start a run again.
    public static async Task NothingLeftAsync(JobScene scene) => await Eventually.TrueAsync(
        "the engine's tables are empty", Patience,
        async () => 0L == (long)(await scene.SqlAsync(
            "SELECT (SELECT count(*) FROM jobs.qrtz_job_details) + (SELECT count(*) FROM jobs.qrtz_triggers) + (SELECT count(*) FROM jobs.qrtz_fired_triggers)"))!,
        Cancellation);
}
