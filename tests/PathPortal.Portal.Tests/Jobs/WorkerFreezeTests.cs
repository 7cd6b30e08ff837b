using PathPortal.Portal.Domain.Runs;
using PathPortal.TestSupport;
using static PathPortal.Portal.Tests.Jobs.RunWaits;

namespace PathPortal.Portal.Tests.Jobs;

/// <summary>A worker that stops for longer than its lease and comes back.</summary>
public sealed class WorkerFreezeTests
{
    private static CancellationToken Cancellation => TestContext.Current.CancellationToken;

    [Fact]
    public async Task Worker_FrozenPastItsLeaseAndThawed_WritesNothingOverTheOthersResult()
    {
        await using var scene = await JobScene.CreateAsync();
        using var one = WorkerProcess.Start(scene.Database!.Worker);
        using var another = WorkerProcess.Start(scene.Database.Worker);
        await PresentAsync(scene, 2);
        var run = (await scene.UploadAsync(JobScene.Path(1, LongPath), cells: 1))[0];
        var (first, second) = await HolderAsync(scene, run, one, another);

        first.FreezeNow();
        var done = await FinishedAsync(scene, second, run);
        first.Thaw();
        // Awake again, it finds that the run is not its own and goes on with other work.
        await Eventually.TrueAsync(
            "the thawed worker gives the run up", Patience, () => Task.FromResult(first.Log.Contains("given up", StringComparison.Ordinal) || first.Log.Contains("kept: False", StringComparison.Ordinal)), Cancellation);

        Assert.Equal((RunState.Done, 2), (done.State, done.Attempts));
        Assert.Contains(second.NamePart, done.WorkerName, StringComparison.Ordinal);
        var after = await scene.RunAsync(run);
        Assert.Equal((done.Version, done.FinishedAt), (after.Version, after.FinishedAt));
        var later = (await scene.UploadAsync(JobScene.Path(2), cells: 1))[0];
        Assert.Equal(RunState.Done, (await FinishedAsync(scene, first, later)).State);
    }
}
