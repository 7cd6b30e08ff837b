using PathPortal.Portal.Domain.Runs;
using PathPortal.TestSupport;
using static PathPortal.Portal.Tests.Jobs.RunWaits;

namespace PathPortal.Portal.Tests.Jobs;

/// <summary>A worker that dies: the other has its run within 15 s, which is what is promised.</summary>
public sealed class WorkerKillTests(ITestOutputHelper output)
{
    private static CancellationToken Cancellation => TestContext.Current.CancellationToken;

    [Fact]
    public async Task Worker_KilledInMidRun_IsReplacedByTheOther()
    {
        await using var scene = await JobScene.CreateAsync();
        using var one = WorkerProcess.Start(scene.Database!.Worker);
        using var another = WorkerProcess.Start(scene.Database.Worker);
        await PresentAsync(scene, 2);
        var run = (await scene.UploadAsync(JobScene.Path(1, LongPath), cells: 1))[0];
        var (first, second) = await HolderAsync(scene, run, one, another);

        first.KillAtOnce();
        var killed = TimeProvider.System.GetTimestamp();
        await Eventually.TrueAsync(
            "the other worker has the run", Patience,
            async () => (await scene.RunAsync(run)).WorkerName?.Contains(second.NamePart, StringComparison.Ordinal) == true, Cancellation);
        output.WriteLine($"The other worker took the run over after {TimeProvider.System.GetElapsedTime(killed).TotalSeconds:F1} s.");
        var done = await FinishedAsync(scene, second, run);
        output.WriteLine($"It was finished after {TimeProvider.System.GetElapsedTime(killed).TotalSeconds:F1} s.");

        Assert.Equal((RunState.Done, 2), (done.State, done.Attempts));
        await NothingLeftAsync(scene);
    }
}
