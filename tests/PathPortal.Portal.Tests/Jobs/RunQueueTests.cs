using System.Text;
using PathPortal.Portal.Jobs;

namespace PathPortal.Portal.Tests.Jobs;

/// <summary>Runs and their jobs come and go in one transaction, under the web's own privileges.</summary>
public sealed class RunQueueTests
{
    private const string Jobs = "SELECT count(*) FROM jobs.qrtz_job_details";

    [Fact]
    public async Task Enqueue_TransactionDropped_LeavesNeitherRunNorJob()
    {
        await using var scene = await JobScene.CreateAsync();
        await using (var session = await scene.Db.OpenAsync(JobScene.Actor, TestContext.Current.CancellationToken))
        {
            scene.Queue.Enqueue(session, await scene.AddAsync(session, Encoding.UTF8.GetBytes(JobScene.Path(1))), RunPriority.Interactive);
            await session.FlushAsync(TestContext.Current.CancellationToken);
            // Seen from inside, both are there already.
            Assert.Equal(2, session.Db.Runs.Local.Count);
        }

        Assert.Equal(0L, await scene.SqlAsync(Jobs));
        Assert.Equal(0L, await scene.SqlAsync("SELECT count(*) FROM runs"));
    }

    [Fact]
    public async Task Enqueue_Committed_LeavesEveryRunWithItsJob()
    {
        await using var scene = await JobScene.CreateAsync();

        var runs = await scene.UploadAsync(JobScene.Path(1));

        Assert.Equal(2, runs.Count);
        Assert.Equal(2L, await scene.SqlAsync(
            "SELECT count(*) FROM runs r JOIN jobs.qrtz_triggers t ON t.job_name = replace(r.batch_id::text, '-', '') WHERE t.trigger_state = 'WAITING'"));
    }

    [Fact]
    public async Task Enqueue_InARecheck_PutsSixtyFourRunsInAJob()
    {
        await using var scene = await JobScene.CreateAsync();
        await using var session = await scene.Db.OpenAsync(JobScene.Actor, TestContext.Current.CancellationToken);
        List<Domain.Runs.Run> runs = [];
        for (var i = 0; i < 130; i++)
            runs.Add(new(scene.PlantId, i.ToString("x64", System.Globalization.CultureInfo.InvariantCulture), 1, session.Now));
        session.Db.Runs.AddRange(runs);
        scene.Queue.Enqueue(session, runs, RunPriority.Bulk);
        await session.CommitAsync(TestContext.Current.CancellationToken);

        Assert.Equal("2,64,64", await scene.SqlAsync(
            "SELECT string_agg(n::text, ',' ORDER BY n) FROM (SELECT count(*) AS n FROM runs GROUP BY batch_id) b"));
        Assert.Equal("bulk", await scene.SqlAsync("SELECT DISTINCT execution_group FROM jobs.qrtz_triggers"));
    }

    [Fact]
    public async Task Enqueue_HeldOpen_TakesNoneOfTheEnginesLocks()
    {
        await using var scene = await JobScene.CreateAsync();
        await using var session = await scene.Db.OpenAsync(JobScene.Actor, TestContext.Current.CancellationToken);
        scene.Queue.Enqueue(session, await scene.AddAsync(session, Encoding.UTF8.GetBytes(JobScene.Path(1))), RunPriority.Interactive);
        await session.FlushAsync(TestContext.Current.CancellationToken);

        Assert.Equal(0L, await scene.SqlAsync(
            "SELECT count(*) FROM pg_locks WHERE relation = 'jobs.qrtz_locks'::regclass AND pid <> pg_backend_pid()"));
    }
}
