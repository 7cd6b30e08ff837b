using System.Globalization;
using Microsoft.Playwright;
using PathPortal.Browser.Tests.Support;
using PathPortal.Engine.Verdicts;
using PathPortal.TestSupport.Runs;

namespace PathPortal.Browser.Tests.Runs;

/// <summary>The run page in a real browser, on an invented run of 60 s at 4 ms with a spike of a single sample.</summary>
public sealed class RunReportTests(Chromium chromium) : IAsyncLifetime
{
    private const int Spike = 8_321;
    private static readonly InventedRun Invented = InventedRun.Create(spike: Spike);

    private RunReportHost _host = null!;
    private IPage _page = null!;
    private int _framesSent;
    private readonly List<string> _troubles = [];

    public async ValueTask InitializeAsync()
    {
        _host = await RunReportHost.StartAsync(Invented);
        _page = await chromium.Browser.NewPageAsync(new() { ViewportSize = Screens.Desk });
        _page.PageError += (_, e) => _troubles.Add(e);
        _page.Console += (_, m) => { if (m.Type == "error") _troubles.Add(m.Text); };
        _page.WebSocket += (_, socket) => socket.FrameSent += (_, _) => Interlocked.Increment(ref _framesSent);
    }

    public async ValueTask DisposeAsync()
    {
        Assert.True(_troubles.Count == 0, string.Join('\n', _troubles));
        await _page.CloseAsync();
        await _host.DisposeAsync();
    }

    [Fact]
    public async Task Pointing_AtTheMap_MovesCursorValuesChartsAndArmToTheWorstSampleOfTheBin()
    {
        await OpenAsync();
        var row = _page.Locator("[data-criterion=JointSpeed]");
        var box = (await row.BoundingBoxAsync())!;
        var before = await PictureAsync();
        await _page.Mouse.MoveAsync(box.X + box.Width * 0.25f, box.Y + box.Height / 2);

        var bins = Invented.Bins;
        var sample = 0.25 * Invented.Count;
        var bin = Enumerable.Range(0, bins.BinCount).Last(b => bins.Edges[b] <= sample);
        var worst = bins.WorstSample[bins.Criteria.IndexOf(Criterion.JointSpeed) * bins.BinCount + bin];
        await CursorAsync(worst);
        await FilledAsync(worst);
        Assert.Equal((worst * 0.004).ToString("0.000", CultureInfo.InvariantCulture) + " s", await _page.Locator("[data-part=time]").InnerTextAsync());
        var joint5 = Invented.Samples.Joints[4][worst] * 180 / Math.PI;
        Assert.Equal(joint5.ToString("0.00", CultureInfo.InvariantCulture).Replace('-', '−'), await _page.Locator("tr[data-joint='4'] [data-column=q4]").InnerTextAsync());
        Assert.InRange((await _page.Locator(".run-cursor").BoundingBoxAsync())!.X, box.X + box.Width * 0.25 - 3, box.X + box.Width * 0.25 + 3);
        Assert.NotEqual(before, await PictureAsync());
    }

    [Fact]
    public async Task Moving_OverMapAndCharts_SendsNothingOverTheCircuit()
    {
        await OpenAsync();
        await _page.Locator("[data-chart=margin]").ScrollIntoViewIfNeededAsync();
        var box = (await _page.Locator("[data-chart=margin]").BoundingBoxAsync())!;
        var sent = _framesSent;
        for (var x = 0.2f; x < 0.9f; x += 0.02f)
            await _page.Mouse.MoveAsync(box.X + box.Width * x, box.Y + 40);
        await _page.WaitForFunctionAsync("() => Number(document.querySelector('.run').dataset.cursor) > 11000");
        Assert.InRange(_framesSent - sent, 0, 1); // the circuit's own sign of life
    }

    [Fact]
    public async Task Clicking_PinsThePlace_LeavingComesBackToIt()
    {
        await OpenAsync();
        var plot = (await _page.Locator(".run-plot-axis").BoundingBoxAsync())!;
        await _page.Mouse.ClickAsync(plot.X + plot.Width * 0.7f, plot.Y + 10);
        await _page.WaitForFunctionAsync("k => Math.abs(Number(document.querySelector('.run').dataset.cursor) - k) < 30", 0.7 * Invented.Count);
        var pinned = int.Parse((await _page.Locator(".run").GetAttributeAsync("data-cursor"))!, CultureInfo.InvariantCulture);
        await _page.Mouse.MoveAsync(plot.X + plot.Width * 0.2f, plot.Y + 10);
        await _page.WaitForFunctionAsync("p => Number(document.querySelector('.run').dataset.cursor) !== p", pinned);
        await _page.Mouse.MoveAsync(plot.X + plot.Width * 0.2f, plot.Y + 120);
        await CursorAsync(pinned);
        await _page.WaitForURLAsync(url => url.Contains("#t=", StringComparison.Ordinal));
    }

    [Fact]
    public async Task ArrowKeys_OnARow_WalkItsBins()
    {
        await OpenAsync();
        var row = _page.Locator("[data-criterion=AcrossPath]");
        await row.FocusAsync();
        await _page.Keyboard.PressAsync("Home");
        await CursorAsync(0);
        await _page.Keyboard.PressAsync("ArrowRight");
        // Bins in which the criterion does not apply are passed over.
        await CursorAsync(Invented.Bins.WorstSample.AsSpan()[..Invented.Bins.BinCount].ToArray().First(k => k >= 0));
        Assert.Contains("seconds, worst here", await row.GetAttributeAsync("aria-valuetext"), StringComparison.Ordinal);
        await _page.Keyboard.PressAsync("ArrowDown");
        Assert.Equal("StandOff", await _page.EvaluateAsync<string>("() => document.activeElement.dataset.criterion"));
    }

    [Fact]
    public async Task Spike_OfOneSample_IsInChartAndMapAtEveryZoom()
    {
        await OpenAsync($"#t={(Spike * 0.004).ToString(CultureInfo.InvariantCulture)}");
        await CursorAsync(Spike);
        var peak = Invented.Samples.AcrossPath[Spike] * 1e3;
        for (var zoom = 0; zoom < 9; zoom++)
        {
            await _page.WaitForFunctionAsync(
                "peak => Math.abs(Math.max(...Array.from(document.querySelector('[data-chart=error] .js-plotly-plot').data[1].y).filter(v => !Number.isNaN(v))) - peak) < 1e-3", peak);
            Assert.True(await _page.Locator("[data-criterion=AcrossPath] path.use-over").CountAsync() > 0, $"zoom {zoom}");
            if (zoom == 0)
                await Screens.TakeAsync(_page, "run-spike", fullPage: false);
            var window = await _page.Locator(".run").GetAttributeAsync("data-window");
            await _page.Locator("[data-zoom=in]").ClickAsync();
            await _page.WaitForFunctionAsync("w => document.querySelector('.run').dataset.window !== w", window);
        }
        // Near enough, the chart holds every sample there is.
        var (from, to) = Window(await _page.Locator(".run").GetAttributeAsync("data-window"));
        Assert.Equal(to - from, await _page.EvaluateAsync<int>("() => document.querySelector('[data-chart=error] .js-plotly-plot').data[1].x.length"));
        await Screens.TakeAsync(_page, "run-zoomed", fullPage: false);
    }

    [Fact]
    public async Task Zooming_OneChart_MovesAllChartsAndTheMap()
    {
        await OpenAsync();
        await _page.Locator("[data-from]").First.ClickAsync();
        await _page.WaitForFunctionAsync("() => document.querySelector('.run').dataset.window !== '0 15001'");
        await _page.WaitForFunctionAsync("""
            () => {
              const ranges = [...document.querySelectorAll('.js-plotly-plot')].map(p => p.layout.xaxis.range.map(t => t.toFixed(2)).join());
              return new Set(ranges).size === 1 && ranges.length > 5;
            }
            """);
        Assert.NotEqual("0 0 15001 30", await _page.Locator("[data-criterion=JointSpeed] svg").GetAttributeAsync("viewBox"));
        await _page.Locator("[data-zoom=all]").ClickAsync();
        await _page.WaitForFunctionAsync("() => document.querySelector('.run').dataset.window === '0 15001'");
    }

    [Fact]
    public async Task Page_DeskAndPhoneLightAndDark_IsAccessibleAndFits()
    {
        await OpenAsync();
        await Accessibility.AssertNoFindingsAsync(_page);
        await Screens.TakeAllAsync(_page, "run");
        await _page.EmulateMediaAsync(new() { ColorScheme = ColorScheme.Dark });
        await Accessibility.AssertNoFindingsAsync(_page);
        await _page.SetViewportSizeAsync(Screens.Phone.Width, Screens.Phone.Height);
        await Accessibility.AssertNoFindingsAsync(_page);
        await Accessibility.AssertNoSidewaysScrollAsync(_page);
    }

    private async Task OpenAsync(string place = "")
    {
        await _page.GotoAsync(_host.Address + place);
        await _page.WaitForFunctionAsync("""
            () => {
              const run = document.querySelector('.run'), lanes = JSON.parse(document.querySelector('[data-lanes]').dataset.lanes);
              return run.dataset.samples === 'here' && run.dataset.filled && run.dataset.window && Number(run.dataset.charts) === lanes.length;
            }
            """);
    }

    private async Task CursorAsync(int sample) =>
        await _page.WaitForFunctionAsync("k => document.querySelector('.run').dataset.cursor === String(k)", sample);

    private async Task FilledAsync(int sample) => await _page.WaitForFunctionAsync("k => document.querySelector('.run').dataset.filled === String(k)", sample);

    private Task<string> PictureAsync() => _page.EvaluateAsync<string>("() => new Promise(done => requestAnimationFrame(() => done(document.querySelector('.arm-scene canvas').toDataURL())))");

    private static (int From, int To) Window(string? text) => text!.Split(' ') is [var from, var to]
        ? (int.Parse(from, CultureInfo.InvariantCulture), int.Parse(to, CultureInfo.InvariantCulture))
        : throw new InvalidOperationException(text);
}
