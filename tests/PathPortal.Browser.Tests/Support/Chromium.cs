using Microsoft.Playwright;

namespace PathPortal.Browser.Tests.Support;

/// <summary>One real Chromium for all tests of the assembly, the one the machine has.</summary>
public sealed class Chromium : IAsyncLifetime
{
    private static readonly string[] Arguments =
    [
        "--no-sandbox", "--no-first-run", "--disable-background-networking", "--disable-component-update", "--disable-sync", "--disable-dev-shm-usage",
        "--enable-unsafe-swiftshader",
    ];

    private IPlaywright? _playwright;

    public IBrowser Browser { get; private set; } = null!;

    public async ValueTask InitializeAsync()
    {
        _playwright = await Playwright.CreateAsync();
        Browser = await _playwright.Chromium.LaunchAsync(new() { ExecutablePath = Find(), Headless = true, Args = Arguments });
    }

    public async ValueTask DisposeAsync()
    {
        await Browser.DisposeAsync();
        _playwright?.Dispose();
    }

    private static string Find()
    {
        string?[] places = [Environment.GetEnvironmentVariable("PATHPORTAL_CHROMIUM"), "/usr/bin/chromium", "/usr/bin/chromium-browser", "/usr/bin/google-chrome"];
        return places.FirstOrDefault(File.Exists) ?? throw new InvalidOperationException("No Chromium found; install the package chromium or set PATHPORTAL_CHROMIUM.");
    }
}
