using Microsoft.Extensions.DependencyInjection;
using PathPortal.Engine;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.Runs;
using PathPortal.Portal.Jobs;
using PathPortal.Portal.Simulation;

namespace PathPortal.Portal.Tests.Jobs;

/// <summary>Samples come out of the frozen inputs again, bit for bit, or not at all.</summary>
public sealed class RunSampleCacheTests
{
    private static CancellationToken Cancellation => TestContext.Current.CancellationToken;

    [Fact]
    public async Task GetAsync_ByManyAtOnce_ComputesOnceAndGivesTheEnginesSamples()
    {
        await using var scene = await JobScene.CreateAsync();
        var run = await DoneAsync(scene, JobScene.Path(1));
        using RunSampleCache cache = new(scene.Db, new());

        var answers = await Task.WhenAll(Enumerable.Range(0, 8).Select(_ => cache.GetAsync(run, Cancellation)));

        Assert.All(answers, a => Assert.Same(answers[0].Value, a.Value));
        Assert.Same(answers[0].Value, (await cache.GetAsync(run, Cancellation)).Value);
        var direct = Simulator.Run(answers[0].Value.Scenario, keepSamples: true, cancellation: Cancellation).Samples!;
        Assert.Equal(direct.Joints[2].Select(BitConverter.DoubleToInt64Bits), answers[0].Value.Samples.Joints[2].Select(BitConverter.DoubleToInt64Bits));
        Assert.True(cache.Size > 0);
    }

    [Fact]
    public async Task GetAsync_MoreThanThereIsRoomFor_DropsTheOldest()
    {
        await using var scene = await JobScene.CreateAsync();
        var first = await DoneAsync(scene, JobScene.Path(1));
        var second = await DoneAsync(scene, JobScene.Path(2));
        using RunSampleCache roomy = new(scene.Db, new());
        await roomy.GetAsync(first, Cancellation);
        using RunSampleCache cache = new(scene.Db, new() { Capacity = roomy.Size * 3 / 2 });

        var before = (await cache.GetAsync(first, Cancellation)).Value;
        await cache.GetAsync(second, Cancellation);

        Assert.InRange(cache.Size, 1, roomy.Size * 3 / 2);
        Assert.NotSame(before, (await cache.GetAsync(first, Cancellation)).Value);
    }

    [Fact]
    public async Task GetAsync_RunNotFinished_IsRefused()
    {
        await using var scene = await JobScene.CreateAsync();
        var run = (await scene.UploadAsync(JobScene.Path(1), cells: 1))[0];
        using RunSampleCache cache = new(scene.Db, new());

        Assert.Equal(RefusalKind.WrongState, (await cache.GetAsync(run, Cancellation)).Refusal?.Kind);
        Assert.Equal(RefusalKind.NotFound, (await cache.GetAsync(Guid.NewGuid(), Cancellation)).Refusal?.Kind);
    }

    [Fact]
    public async Task GetAsync_TooLongForAPage_IsRefusedBeforeComputing()
    {
        await using var scene = await JobScene.CreateAsync();
        var run = await DoneAsync(scene, JobScene.Path(1));
        using RunSampleCache cache = new(scene.Db, new() { MostSamples = 2 });

        Assert.Contains("longer", (await cache.GetAsync(run, Cancellation)).Refusal?.Message, StringComparison.Ordinal);
    }

    [Fact]
    public async Task GetAsync_StoredResultAltered_IsRefused()
    {
        await using var scene = await JobScene.CreateAsync();
        var run = await DoneAsync(scene, JobScene.Path(1));
        await scene.SqlAsync("SET session_replication_role = replica; UPDATE runs SET bins = set_byte(bins, octet_length(bins) - 1, 1)");
        using RunSampleCache cache = new(scene.Db, new());

        Assert.Equal(RefusalKind.Stale, (await cache.GetAsync(run, Cancellation)).Refusal?.Kind);
    }

    [Fact]
    public async Task PackAsync_OfADoneRun_KeepsItsSamples()
    {
        await using var scene = await JobScene.CreateAsync();
        var run = await DoneAsync(scene, JobScene.Path(1));
        using RunSampleCache cache = new(scene.Db, new());

        var packed = (await new DecisionSamples(scene.Db, cache).PackAsync(run, Cancellation)).Value;

        Assert.Equal((await cache.GetAsync(run, Cancellation)).Value.Samples.ToolPosition[0], SampleArchive.Unpack(packed).ToolPosition[0]);
    }

    private static async Task<Guid> DoneAsync(JobScene scene, string path)
    {
        var run = (await scene.UploadAsync(path, cells: 1))[0];
        await using var worker = scene.WorkerServices();
        await worker.GetRequiredService<RunComputer>().ComputeAsync(run, (await scene.RunAsync(run)).BatchId!.Value, ownerLost: false, Cancellation);
        var done = await scene.RunAsync(run);
        Assert.True(done.State == RunState.Done, done.Error);
        return run;
    }
}
