using Npgsql;
using PathPortal.Portal.Domain.Runs;
using PathPortal.TestSupport;
using static PathPortal.Portal.Tests.Jobs.RunWaits;

namespace PathPortal.Portal.Tests.Jobs;

/// <summary>A database that goes away under a worker and comes back.</summary>
public sealed class WorkerOutageTests(ITestOutputHelper output)
{
    private static CancellationToken Cancellation => TestContext.Current.CancellationToken;

    [Fact]
    public async Task Worker_ItsDatabaseSessionsTerminated_StillBringsItsResult()
    {
        await using var scene = await JobScene.CreateAsync();
        using var worker = WorkerProcess.Start(scene.Database!.Worker);
        var run = (await scene.UploadAsync(JobScene.Path(1, LongPath), cells: 1))[0];
        await UnderWayAsync(scene, worker, run);

        await scene.SqlAsync("SELECT count(pg_terminate_backend(pid)) FROM pg_stat_activity WHERE usename = 'pathportal_worker' AND datname = current_database()");

        Assert.Equal(RunState.Done, (await FinishedAsync(scene, worker, run)).State);
        await NothingLeftAsync(scene);
    }

    [Fact]
    public async Task Worker_DatabaseKilledAndStartedAgainInMidRun_LosesNothing()
    {
        await using var server = await PrivatePostgres.StartAsync(Cancellation);
        await new Data.Provisioning.DatabaseMigrator(new(server.ConnectionString, server.ConnectionString, server.ConnectionString)).RunAsync(Cancellation);
        await using var scene = await JobScene.CreateAsync(server.ConnectionString);
        using var worker = WorkerProcess.Start(server.ConnectionString);
        var run = (await scene.UploadAsync(JobScene.Path(1, LongPath), cells: 1))[0];
        await UnderWayAsync(scene, worker, run);

        await server.KillAsync(Cancellation);
        await server.StartAgainAsync(Cancellation);
        var back = TimeProvider.System.GetTimestamp();

        var next = await Eventually.GetAsync("an upload succeeds", Patience, () => TryUploadAsync(scene), Cancellation);
        await FinishedAsync(scene, worker, next[0]);
        output.WriteLine($"A new upload was computed {TimeProvider.System.GetElapsedTime(back).TotalSeconds:F1} s after the database was back.");
        Assert.Equal(RunState.Done, (await FinishedAsync(scene, worker, run)).State);
    }

    // Connections that were open before the restart fail once each.
    private static async Task<List<Guid>?> TryUploadAsync(JobScene scene)
    {
        try
        {
            return await scene.UploadAsync(JobScene.Path(2), cells: 1);
        }
        catch (NpgsqlException)
        {
            return null;
        }
    }
}
