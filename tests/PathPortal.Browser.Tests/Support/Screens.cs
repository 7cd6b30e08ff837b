using Microsoft.Playwright;

namespace PathPortal.Browser.Tests.Support;

/// <summary>Pictures of pages for people to look at, in artifacts/screens of the repository.</summary>
public static class Screens
{
    public static readonly ViewportSize Desk = new() { Width = 1440, Height = 900 };
    public static readonly ViewportSize Phone = new() { Width = 390, Height = 844 };

    private static readonly string Folder = Path.Combine(RepositoryRoot(), "artifacts", "screens");

    /// <summary>Writes the page as it is now to artifacts/screens/NAME.png.</summary>
    public static Task TakeAsync(IPage page, string name, bool fullPage = true) =>
        page.ScreenshotAsync(new() { Path = Path.Combine(Folder, name + ".png"), FullPage = fullPage, Animations = ScreenshotAnimations.Disabled });

    /// <summary>The page at desk and phone width, light and dark; leaves it at desk width, light.</summary>
    public static async Task TakeAllAsync(IPage page, string name)
    {
        foreach (var (size, sizeName) in new[] { (Desk, "desk"), (Phone, "phone") })
            foreach (var (scheme, schemeName) in new[] { (ColorScheme.Light, "light"), (ColorScheme.Dark, "dark") })
            {
                await page.SetViewportSizeAsync(size.Width, size.Height);
                await page.EmulateMediaAsync(new() { ColorScheme = scheme });
                await TakeAsync(page, $"{name}-{sizeName}-{schemeName}");
            }
        await page.SetViewportSizeAsync(Desk.Width, Desk.Height);
        await page.EmulateMediaAsync(new() { ColorScheme = ColorScheme.Light });
    }

    private static string RepositoryRoot()
    {
        for (var folder = new DirectoryInfo(AppContext.BaseDirectory); folder is not null; folder = folder.Parent)
            if (File.Exists(Path.Combine(folder.FullName, "PathPortal.sln")))
                return folder.FullName;
        throw new InvalidOperationException("The tests run outside the repository.");
    }
}
