using System.Net;
using PathPortal.TestSupport.Runs;
using PathPortal.Web.Features.Runs.Samples;
using PathPortal.Web.Tests.Support;

namespace PathPortal.Web.Tests.Features.Runs;

public sealed class RunAccessTests(SiteFixture fixture) : IClassFixture<SiteFixture>, IAsyncLifetime
{
    private static readonly string[] Addresses =
    [
        "", "/progress", "/samples/bins", "/samples/scene", "/samples/window?bins=600&names=track", "/samples/block?from=0&count=256",
    ];

    private StoredRuns _runs = null!;

    public async ValueTask InitializeAsync() => _runs = await Shared.Value(fixture);

    public ValueTask DisposeAsync() => ValueTask.CompletedTask;

    [Fact]
    public async Task EveryAddress_AccountOfAnotherPlant_LearnsNothing()
    {
        var run = await _runs.DoneAsync(InventedRun.Create(400));
        using var visitor = fixture.Site.Visit();
        await visitor.SignInAsync(StoredRuns.Stranger);
        foreach (var address in Addresses)
        {
            var here = await visitor.GetAsync($"/runs/{run.Id}{address}");
            var nowhere = await visitor.GetAsync($"/runs/{Guid.NewGuid()}{address}");
            Assert.True(here.Status == HttpStatusCode.NotFound, $"{address}: {here.Status}");
            Assert.Equal(nowhere.Status, here.Status);
            Assert.DoesNotContain("Hatch seam", here.Text, StringComparison.Ordinal);
        }
    }

    [Fact]
    public async Task EveryAddress_NobodySignedIn_AsksToSignIn()
    {
        var run = await _runs.DoneAsync(InventedRun.Create(400));
        using var visitor = fixture.Site.Visit();
        foreach (var address in Addresses)
        {
            var answer = await visitor.Client.GetAsync(new Uri($"/runs/{run.Id}{address}", UriKind.Relative), TestContext.Current.CancellationToken);
            Assert.True(answer.StatusCode == HttpStatusCode.Redirect, $"{address}: {answer.StatusCode}");
            Assert.StartsWith("/sign-in", answer.Headers.Location!.PathAndQuery, StringComparison.Ordinal);
        }
    }

    [Fact]
    public async Task Bins_ReaderOfThePlant_GetsTheStoredBins()
    {
        var invented = InventedRun.Create(400);
        var run = await _runs.DoneAsync(invented);
        using var visitor = fixture.Site.Visit();
        await visitor.SignInAsync(StoredRuns.Reader);
        var answer = await visitor.Client.GetAsync(new Uri($"/runs/{run.Id}/samples/bins", UriKind.Relative), TestContext.Current.CancellationToken);
        Assert.Equal(PackedSamples.ContentType, answer.Content.Headers.ContentType!.MediaType);
        Assert.True(answer.Headers.CacheControl!.NoStore);
        var packed = new Packed(await answer.Content.ReadAsByteArrayAsync(TestContext.Current.CancellationToken));
        Assert.Equal(invented.Bins.Edges, packed.Samples("edges"));
    }

    [Fact]
    public async Task Page_DoneRun_SaysVerdictPlaceAndReasonWithoutScript()
    {
        var invented = InventedRun.Create(2_000);
        var run = await _runs.DoneAsync(invented);
        using var visitor = fixture.Site.Visit();
        await visitor.SignInAsync(StoredRuns.Reader);
        var page = await visitor.GetAsync($"/runs/{run.Id}");
        Assert.Equal(HttpStatusCode.OK, page.Status);
        Assert.Equal("Hatch seam, revision 1 on North <3>", page.Document.QuerySelector("h1")!.TextContent);
        var sentence = page.Document.QuerySelector("#verdict-sentence")!.TextContent;
        Assert.Contains("joint 5", sentence, StringComparison.Ordinal);
        Assert.Contains("towards waypoint", sentence, StringComparison.Ordinal);
        Assert.Equal(invented.Bins.Criteria.Length, page.Document.QuerySelectorAll(".run-plot[data-row]").Length);
        Assert.NotNull(page.Document.QuerySelector(".caution"));
        Assert.Contains("not measured", page.Document.QuerySelector(".run-strip")!.TextContent, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Page_RunningRun_ShowsProgressAndFollowsIt()
    {
        var run = await _runs.RunningAsync(0.42);
        using var visitor = fixture.Site.Visit();
        await visitor.SignInAsync(StoredRuns.Reader);
        var page = await visitor.GetAsync($"/runs/{run.Id}");
        Assert.Equal("42", page.Document.QuerySelector("[role=progressbar]")!.GetAttribute("aria-valuenow"));
        Assert.Equal($"/runs/{run.Id}/progress", page.Document.QuerySelector("[data-live]")!.GetAttribute("data-live"));
        Assert.Equal(HttpStatusCode.Conflict, (await visitor.GetAsync($"/runs/{run.Id}/samples/scene")).Status);
    }

    [Fact]
    public async Task Page_FailedRun_SaysWhyAndThatItIsNoVerdict()
    {
        var run = await _runs.FailedAsync("Line 7 of the path gives a posture of 5 values, but the arm has 6 joints.");
        using var visitor = fixture.Site.Visit();
        await visitor.SignInAsync(StoredRuns.Reader);
        var page = await visitor.GetAsync($"/runs/{run.Id}");
        Assert.Contains("Line 7 of the path", page.Text, StringComparison.Ordinal);
        Assert.Contains("no verdict", page.Text, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Page_OlderRunOfThePair_PointsToTheCurrentOne()
    {
        var old = await _runs.DoneAsync(InventedRun.Create(400));
        var current = await _runs.DoneAsync(InventedRun.Create(500));
        using var visitor = fixture.Site.Visit();
        await visitor.SignInAsync(StoredRuns.Reader);
        Assert.NotNull((await visitor.GetAsync($"/runs/{old.Id}")).Document.QuerySelector($"a[href='/runs/{current.Id}']"));
        Assert.Null((await visitor.GetAsync($"/runs/{current.Id}")).Document.QuerySelector($".note a[href^='/runs/']"));
    }

    /// <summary>One company for all tests of the class, whichever runs first.</summary>
    private static class Shared
    {
        private static Task<StoredRuns>? s_made;
        private static readonly Lock Gate = new();

        public static Task<StoredRuns> Value(SiteFixture fixture)
        {
            lock (Gate)
                return s_made ??= StoredRuns.MakeAsync(fixture.Site.People);
        }
    }
}
