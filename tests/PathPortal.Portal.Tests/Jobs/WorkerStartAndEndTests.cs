using PathPortal.Portal.Domain.Runs;
using PathPortal.TestSupport;
using static PathPortal.Portal.Tests.Jobs.RunWaits;

namespace PathPortal.Portal.Tests.Jobs;

/// <summary>How a worker begins and ends.</summary>
public sealed class WorkerStartAndEndTests
{
    private static CancellationToken Cancellation => TestContext.Current.CancellationToken;

    [Fact]
    public async Task Worker_AskedToEndInMidRun_FinishesOrGivesBackAndEnds()
    {
        await using var scene = await JobScene.CreateAsync();
        using var first = WorkerProcess.Start(scene.Database!.Worker);
        List<Guid> runs = [.. await scene.UploadAsync(JobScene.Path(1, LongPath)), .. await scene.UploadAsync(JobScene.Path(2))];
        await UnderWayAsync(scene, first, runs[0]);

        first.AskToEnd();
        await first.WaitForExitAsync(Cancellation);

        Assert.Equal(0, first.ExitCode);
        Assert.Equal(0L, await scene.SqlAsync("SELECT count(*) FROM workers"));
        var left = await scene.RunsAsync();
        Assert.DoesNotContain(left, r => r.State == RunState.Running);
        using var second = WorkerProcess.Start(scene.Database.Worker);
        await AllDoneAsync(scene, second);
        await NothingLeftAsync(scene);
    }

    [Fact]
    public async Task Worker_DatabaseNotMigratedYet_SaysSoOnceAndWaits()
    {
        await using var scene = await JobScene.CreateAsync();
        await scene.SqlAsync("UPDATE applied_migrations SET \"MigrationId\" = '2' WHERE \"MigrationId\" = (SELECT max(\"MigrationId\") FROM applied_migrations)");
        using var worker = WorkerProcess.Start(scene.Database!.Worker);
        await Eventually.TrueAsync(
            "the worker says what it waits for", Patience, () => Task.FromResult(worker.Log.Contains("migrate", StringComparison.Ordinal)), Cancellation);

        var runs = await scene.UploadAsync(JobScene.Path(1));
        Assert.False(worker.HasExited);
        Assert.All(await scene.RunsAsync(), r => Assert.Equal(RunState.Queued, r.State));
        await scene.SqlAsync("UPDATE applied_migrations SET \"MigrationId\" = $1 WHERE \"MigrationId\" = '2'", Data.PortalSchema.Expected);

        await AllDoneAsync(scene, worker);
        Assert.Equal(2, runs.Count);
        Assert.Single(worker.Log.Split('\n'), line => line.Contains("Run the migrate command", StringComparison.Ordinal));
    }
}
