using Microsoft.Extensions.DependencyInjection;
using PathPortal.Portal.Domain.Runs;
using PathPortal.Portal.Jobs;

namespace PathPortal.Portal.Tests.Jobs;

/// <summary>Whatever happened to a job, its runs come to another one; what is well is left alone.</summary>
public sealed class RunReconcilerTests
{
    private const string LiveJobs =
        "SELECT count(*) FROM runs r JOIN jobs.qrtz_triggers t ON t.job_name = replace(r.batch_id::text, '-', '') WHERE t.trigger_state = 'WAITING'";

    private static CancellationToken Cancellation => TestContext.Current.CancellationToken;

    [Fact]
    public async Task RunAsync_NothingWrong_ChangesNothing()
    {
        await using var scene = await JobScene.CreateAsync();
        await scene.UploadAsync(JobScene.Path(1));
        var before = (await scene.RunsAsync()).Select(r => (r.BatchId, r.Version));
        await using var worker = scene.WorkerServices();

        Assert.Equal(0, await ReconcileAsync(worker));
        Assert.Equal(before, (await scene.RunsAsync()).Select(r => (r.BatchId, r.Version)));
    }

    [Fact]
    public async Task RunAsync_QueuedRunsWhoseJobIsGone_GetANewJob()
    {
        await using var scene = await JobScene.CreateAsync();
        await scene.UploadAsync(JobScene.Path(1));
        await scene.SqlAsync("TRUNCATE jobs.qrtz_job_details CASCADE");
        await using var worker = scene.WorkerServices();

        Assert.Equal(2, await ReconcileAsync(worker));
        Assert.Equal(2L, await scene.SqlAsync(LiveJobs));
        Assert.Equal(0, await ReconcileAsync(worker));
    }

    [Fact]
    public async Task RunAsync_JobWhoseTriggerBroke_IsReplacedAndRemoved()
    {
        await using var scene = await JobScene.CreateAsync();
        await scene.UploadAsync(JobScene.Path(1), cells: 1);
        await scene.SqlAsync("UPDATE jobs.qrtz_triggers SET trigger_state = 'ERROR'");
        await using var worker = scene.WorkerServices();

        Assert.Equal(1, await ReconcileAsync(worker));
        Assert.Equal(1L, await scene.SqlAsync(LiveJobs));
        Assert.Equal(1L, await scene.SqlAsync("SELECT count(*) FROM jobs.qrtz_job_details"));
    }

    [Fact]
    public async Task RunAsync_RunningOnAWorkerNotSeen_IsQueuedAgain()
    {
        await using var scene = await JobScene.CreateAsync();
        var run = (await scene.UploadAsync(JobScene.Path(1), cells: 1))[0];
        await scene.SqlAsync("UPDATE runs SET state = 'Running', worker_name = 'gone', started_at = now() - interval '31 seconds', attempts = 1");
        await using var worker = scene.WorkerServices();

        Assert.Equal(1, await ReconcileAsync(worker));
        Assert.Equal((RunState.Queued, 1), await StateAsync(scene, run));
    }

    [Fact]
    public async Task RunAsync_RunningOnALivingWorkerWithItsJob_IsLeftAlone()
    {
        await using var scene = await JobScene.CreateAsync();
        var run = (await scene.UploadAsync(JobScene.Path(1), cells: 1))[0];
        await scene.SqlAsync("INSERT INTO workers VALUES ('alive', now(), now())");
        await scene.SqlAsync("UPDATE runs SET state = 'Running', worker_name = 'alive', started_at = now() - interval '1 hour', attempts = 1");
        await using var worker = scene.WorkerServices();

        Assert.Equal(0, await ReconcileAsync(worker));
        Assert.Equal((RunState.Running, 1), await StateAsync(scene, run));
    }

    [Fact]
    public async Task RunAsync_FinishedRuns_AreLeftAlone()
    {
        await using var scene = await JobScene.CreateAsync();
        await scene.UploadAsync(JobScene.Path(1));
        await scene.SqlAsync("UPDATE runs SET state = 'Failed', error = 'invented'");
        await scene.SqlAsync("TRUNCATE jobs.qrtz_job_details CASCADE");
        await using var worker = scene.WorkerServices();

        Assert.Equal(0, await ReconcileAsync(worker));
    }

    private static Task<int> ReconcileAsync(ServiceProvider worker) => worker.GetRequiredService<RunReconciler>().RunAsync(Cancellation);

    private static async Task<(RunState, int)> StateAsync(JobScene scene, Guid id)
    {
        var run = await scene.RunAsync(id);
        return (run.State, run.Attempts);
    }
}
