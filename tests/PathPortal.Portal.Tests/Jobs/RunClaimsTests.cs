using Microsoft.Extensions.DependencyInjection;
using PathPortal.Engine.Verdicts;
using PathPortal.Portal.Domain.Runs;
using PathPortal.Portal.Jobs;

namespace PathPortal.Portal.Tests.Jobs;

/// <summary>Two workers and one run: whoever was overtaken writes nothing.</summary>
public sealed class RunClaimsTests
{
    private static readonly RunConclusion Conclusion = new(Verdict.Pass, 0.5, Criterion.JointSpeed, 1, "{}", null);

    private static CancellationToken Cancellation => TestContext.Current.CancellationToken;

    [Fact]
    public async Task TakeAsync_RunOfALivingWorker_IsLeftToIt()
    {
        await using var stage = await StageAsync();
        await stage.First.Beat();
        Assert.NotNull(await stage.First.Take(ownerLost: false));

        Assert.Null(await stage.Second.Take(ownerLost: false));
        Assert.Equal(1, (await stage.Scene.RunAsync(stage.Run)).Attempts);
    }

    [Fact]
    public async Task TakeAsync_RunOfAWorkerNeverSeen_IsTakenOver()
    {
        await using var stage = await StageAsync();
        Assert.NotNull(await stage.First.Take(ownerLost: false));

        Assert.Equal(2, (await stage.Second.Take(ownerLost: false))?.Attempt);
    }

    [Fact]
    public async Task CompleteAsync_AfterAnotherTookOver_WritesNothing()
    {
        await using var stage = await StageAsync();
        var frozen = await stage.First.Take(ownerLost: false);
        var taker = await stage.Second.Take(ownerLost: true);

        Assert.False(await stage.First.Claims.AdvanceAsync(frozen!, 0.5, Cancellation));
        Assert.False(await stage.First.Claims.CompleteAsync(frozen!, Conclusion with { WorstUse = 9 }, Cancellation));
        Assert.False(await stage.First.Claims.FailAsync(frozen!, "late", Cancellation));
        Assert.True(await stage.Second.Claims.CompleteAsync(taker!, Conclusion, Cancellation));
        Assert.False(await stage.First.Claims.CompleteAsync(frozen!, Conclusion with { WorstUse = 9 }, Cancellation));

        var run = await stage.Scene.RunAsync(stage.Run);
        Assert.Equal((RunState.Done, 0.5, 2), (run.State, run.WorstUse, run.Attempts));
    }

    [Fact]
    public async Task CompleteAsync_Twice_KeepsTheFirstResult()
    {
        await using var stage = await StageAsync();
        var claim = await stage.First.Take(ownerLost: false);

        Assert.True(await stage.First.Claims.CompleteAsync(claim!, Conclusion, Cancellation));
        Assert.False(await stage.First.Claims.CompleteAsync(claim!, Conclusion with { WorstUse = 9 }, Cancellation));

        Assert.Equal(0.5, (await stage.Scene.RunAsync(stage.Run)).WorstUse);
    }

    [Fact]
    public async Task TakeAsync_RunThatTookDownTooManyWorkers_IsGivenUpWithAReason()
    {
        await using var stage = await StageAsync();
        for (var i = 0; i < Run.MaxAttempts; i++)
            Assert.NotNull(await stage.First.Take(ownerLost: true));

        Assert.Null(await stage.Second.Take(ownerLost: true));

        var run = await stage.Scene.RunAsync(stage.Run);
        Assert.Equal(RunState.Failed, run.State);
        Assert.Contains("5 workers stopped", run.Error, StringComparison.Ordinal);
    }

    [Fact]
    public async Task AdvanceAsync_LowerThanBefore_NeverGoesBack()
    {
        await using var stage = await StageAsync();
        var claim = await stage.First.Take(ownerLost: false);

        Assert.True(await stage.First.Claims.AdvanceAsync(claim!, 0.7, Cancellation));
        Assert.True(await stage.First.Claims.AdvanceAsync(claim!, 0.4, Cancellation));

        Assert.Equal(0.7, (await stage.Scene.RunAsync(stage.Run)).Progress);
    }

    private static async Task<Stage> StageAsync()
    {
        var scene = await JobScene.CreateAsync();
        var run = (await scene.UploadAsync(JobScene.Path(1), cells: 1))[0];
        return new(scene, run, (await scene.RunAsync(run)).BatchId!.Value);
    }

    private sealed class Stage : IAsyncDisposable
    {
        public Stage(JobScene scene, Guid run, Guid batch)
        {
            (Scene, Run) = (scene, run);
            First = new(scene.WorkerServices(), run, batch);
            Second = new(scene.WorkerServices(), run, batch);
        }

        public JobScene Scene { get; }

        public Guid Run { get; }

        public Side First { get; }

        public Side Second { get; }

        public async ValueTask DisposeAsync()
        {
            await First.Services.DisposeAsync();
            await Second.Services.DisposeAsync();
            await Scene.DisposeAsync();
        }
    }

    private sealed record Side(ServiceProvider Services, Guid Run, Guid Batch)
    {
        public RunClaims Claims => Services.GetRequiredService<RunClaims>();

        public Task Beat() => Services.GetRequiredService<WorkerHeartbeat>().BeatAsync(Cancellation);

        public Task<RunClaim?> Take(bool ownerLost) => Claims.TakeAsync(Run, Batch, ownerLost, Cancellation);
    }
}
