using PathPortal.Portal.Domain.Runs;
using PathPortal.TestSupport;
using static PathPortal.Portal.Tests.Jobs.RunWaits;

namespace PathPortal.Portal.Tests.Jobs;

/// <summary>A real worker process on a real database, when nothing goes wrong but the inputs.</summary>
public sealed class WorkerProcessTests
{
    private static CancellationToken Cancellation => TestContext.Current.CancellationToken;

    [Fact]
    public async Task Upload_WithAWorker_IsComputedOnceAndSharedBySameDigest()
    {
        await using var scene = await JobScene.CreateAsync();
        using var worker = WorkerProcess.Start(scene.Database!.Worker);

        var runs = await scene.UploadAsync(JobScene.Path(1));
        var again = await scene.UploadAsync(JobScene.Path(1));
        await AllDoneAsync(scene, worker);

        Assert.Equal(2, runs.Count);
        Assert.Empty(again);
        var rows = await scene.RunsAsync();
        Assert.Equal(2, rows.Count);
        Assert.All(rows, r => Assert.Equal((1, 1.0), (r.Attempts, r.Progress)));
        Assert.All(rows, r => Assert.NotNull(r.SummaryJson));
        Assert.Equal(4L, await scene.SqlAsync("SELECT count(*) FROM run_requests"));
        // Their jobs are gone with them.
        await Eventually.TrueAsync(
            "no job is left", Patience, async () => 0L == (long)(await scene.SqlAsync("SELECT count(*) FROM jobs.qrtz_job_details"))!, Cancellation);
    }

    [Fact]
    public async Task RunWhoseInputsComeToAnotherDigest_FailsNamingBoth()
    {
        await using var scene = await JobScene.CreateAsync();
        using var worker = WorkerProcess.Start(scene.Database!.Worker);
        var wrong = new string('a', 64);
        await using (var session = await scene.Db.OpenAsync(JobScene.Actor, Cancellation))
        {
            var source = System.Text.Encoding.UTF8.GetBytes(JobScene.Path(1));
            scene.Queue.Enqueue(session, await scene.AddAsync(session, source, cells: 1, digest: wrong), Portal.Jobs.RunPriority.Interactive);
            await session.CommitAsync(Cancellation);
        }

        var run = await FinishedAsync(scene, worker, (await scene.RunsAsync())[0].Id);

        Assert.Equal(RunState.Failed, run.State);
        Assert.Contains(wrong, run.Error, StringComparison.Ordinal);
        Assert.Matches("[0-9a-f]{64}.*[0-9a-f]{64}", run.Error!);
    }
}
