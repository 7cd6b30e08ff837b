using Microsoft.Playwright;
using PathPortal.Browser.Tests.Support;
using PathPortal.TestSupport.Runs;

namespace PathPortal.Browser.Tests.Runs;

public sealed class LookTests(Chromium chromium)
{
    [Fact]
    public async Task Look()
    {
        await using var host = await RunReportHost.StartAsync(InventedRun.Create());
        Console.WriteLine(host.Address);
        var page = await chromium.Browser.NewPageAsync();
        page.Console += (_, e) => Console.WriteLine($"{e.Type}: {e.Text}");
        page.PageError += (_, e) => Console.WriteLine(e);
        page.RequestFailed += (_, e) => Console.WriteLine("failed " + e.Url);
        page.Response += (_, e) => { if (e.Status >= 400) Console.WriteLine($"{e.Status} {e.Url}"); };
        while (File.Exists("/tmp/runpage/go") || !File.Exists("/tmp/runpage/stop"))
        {
            if (!File.Exists("/tmp/runpage/go")) { await page.WaitForTimeoutAsync(300); continue; }
            File.Delete("/tmp/runpage/go");
            await page.SetViewportSizeAsync(1440, 900);
            await page.GotoAsync(host.Address.ToString());
            await page.WaitForTimeoutAsync(2500);
            Directory.CreateDirectory("/tmp/runpage/out");
            await page.ScreenshotAsync(new() { Path = "/tmp/runpage/out/desk.png" });
            await page.ScreenshotAsync(new() { Path = "/tmp/runpage/out/desk-full.png", FullPage = true });
            await page.EmulateMediaAsync(new() { ColorScheme = ColorScheme.Dark });
            await page.WaitForTimeoutAsync(500);
            await page.ScreenshotAsync(new() { Path = "/tmp/runpage/out/desk-dark.png" });
            await page.SetViewportSizeAsync(390, 844);
            await page.EmulateMediaAsync(new() { ColorScheme = ColorScheme.Light });
            await page.WaitForTimeoutAsync(800);
            await page.ScreenshotAsync(new() { Path = "/tmp/runpage/out/phone.png", FullPage = true });
            File.WriteAllText("/tmp/runpage/done", "");
        }
    }
}
