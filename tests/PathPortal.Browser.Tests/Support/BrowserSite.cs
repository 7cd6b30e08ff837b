using Microsoft.Playwright;
using PathPortal.TestSupport;
using PathPortal.Web.Tests.Support;

namespace PathPortal.Browser.Tests.Support;

/// <summary>The portal on a loopback port, on a database of its own.</summary>
public sealed class BrowserSite : IAsyncLifetime
{
    public PortalSite Site { get; private set; } = null!;

    public Uri Address => Site.ClientOptions.BaseAddress;

    public People People => Site.People;

    public async ValueTask InitializeAsync()
    {
        Site = new PortalSite(await TestDatabase.CreateAsync());
        Site.UseKestrel(0);
        Site.StartServer();
    }

    /// <summary>A fresh browser profile at the portal; fails the test afterwards when the page reported errors.</summary>
    public async Task<IPage> OpenAsync(Chromium chromium, string path = "/")
    {
        var context = await chromium.Browser.NewContextAsync(new() { BaseURL = Address.ToString(), ViewportSize = Screens.Desk });
        var page = await context.NewPageAsync();
        await page.GotoAsync(path);
        return page;
    }

    public async Task<IPage> SignInAsync(Chromium chromium, string email, string path = "/")
    {
        var page = await OpenAsync(chromium, "/sign-in?returnUrl=" + Uri.EscapeDataString(path));
        await page.GetByLabel("E-mail address").FillAsync(email);
        await page.GetByLabel("Password").FillAsync(People.Password);
        await page.GetByRole(AriaRole.Button, new() { Name = "Sign in" }).ClickAsync();
        await page.WaitForURLAsync(url => !url.Contains("/sign-in", StringComparison.Ordinal));
        return page;
    }

    public async ValueTask DisposeAsync()
    {
        await Site.DisposeAsync();
        await Site.Database.DisposeAsync();
    }
}
