using System.Net;
using PathPortal.Web.Features.Runs.Samples;
using PathPortal.Web.Tests.Support;

namespace PathPortal.Web.Tests.Features.Runs;

/// <summary>From stored inputs over the engine to the bytes a browser gets.</summary>
public sealed class RunSamplesTests(SiteFixture fixture) : IClassFixture<SiteFixture>
{
    // float32 keeps 24 bits.
    private const double RelativeFloat32 = 6e-8;

    [Fact]
    public async Task Samples_OfAComputedRun_AreThoseOfTheEngine()
    {
        var (run, result) = await (await StoredRuns.MakeAsync(fixture.Site.People)).ComputedAsync();
        var samples = result.Samples!;
        using var visitor = fixture.Site.Visit();
        await visitor.SignInAsync(StoredRuns.Reader);

        var scene = await GetAsync("scene");
        Assert.Equal(samples.Count, scene.About.GetProperty("count").GetInt32());
        Assert.Equal(6, scene.About.GetProperty("drawing").GetProperty("joints").GetArrayLength());
        var frames = scene.Samples("frame");
        AssertClose(samples.Joints[2][frames[7]], scene.Values("q2")[7]);

        var (points, values) = (await GetAsync("window?bins=500&names=track")).Thinned("track");
        var worst = Array.IndexOf(samples.TrackingError, samples.TrackingError.Max());
        AssertClose(samples.TrackingError[worst] * 1e3, values[Array.IndexOf(points, worst)]);

        var block = await GetAsync($"block?from={worst}&count=1");
        AssertClose(samples.JointSpeedDemands[3][worst] * 180 / Math.PI, block.Values("d3")[0]);
        Assert.Equal(HttpStatusCode.OK, (await visitor.GetAsync($"/runs/{run.Id}")).Status);

        async Task<Packed> GetAsync(string what)
        {
            var answer = await visitor.Client.GetAsync(new Uri($"/runs/{run.Id}/samples/{what}", UriKind.Relative), TestContext.Current.CancellationToken);
            Assert.True(answer.IsSuccessStatusCode, $"{what}: {answer.StatusCode} {await answer.Content.ReadAsStringAsync(TestContext.Current.CancellationToken)}");
            Assert.Equal(PackedSamples.ContentType, answer.Content.Headers.ContentType!.MediaType);
            return new(await answer.Content.ReadAsByteArrayAsync(TestContext.Current.CancellationToken));
        }
    }

    private static void AssertClose(double expected, float actual) =>
        Assert.InRange(actual, expected - Math.Abs(expected) * RelativeFloat32, expected + Math.Abs(expected) * RelativeFloat32);
}
