using Microsoft.Playwright;
using PathPortal.Browser.Tests.Support;
using PathPortal.Portal.Domain.People;
using PathPortal.Web.Tests.Support;

namespace PathPortal.Browser.Tests;

/// <summary>Pages that show what is there: looked at in both schemes and widths, held to the accessibility rules.</summary>
public sealed class ReadingPagesTests(Chromium chromium, BrowserSite site) : IClassFixture<BrowserSite>
{
    [Fact]
    public async Task Pages_SampleCompany_AreReadableAndAccessible()
    {
        var company = await SampleCompany.MakeAsync(site.People);
        var stranger = await site.OpenAsync(chromium);
        await HoldAsync(stranger, "sign-in");

        var page = await site.SignInAsync(chromium, "owner@plant.example");
        await HoldAsync(page, "fleet");
        foreach (var (path, name) in new[]
        {
            ("/programs", "programs"), ($"/programs/{company.Sealing.Id}", "program"), ($"/reviews/{company.InReview.Id}", "review"),
            ($"/reviews/{company.FailingReview.Id}", "review-failing"), ("/history", "history"), ("/setup", "setup"), ("/nothing/here", "not-found"),
        })
        {
            await page.GotoAsync(path);
            await HoldAsync(page, name);
        }
    }

    [Fact]
    public async Task Pages_FormsOfAuthorAndAdministrator_AreReadableAndAccessible()
    {
        var plant = await site.People.PlantAsync("Quay works");
        await site.People.AccountAsync("admin@plant.example", "Ines Administrator", administersCompany: true, (plant, Role.Author));
        var page = await site.SignInAsync(chromium, "admin@plant.example");
        await HoldAsync(page, "fleet-administrator");
        foreach (var (path, name) in new[] { ("/setup/people", "people"), ("/programs/new", "program-new") })
        {
            await page.GotoAsync(path);
            await HoldAsync(page, name);
        }
    }

    private static async Task HoldAsync(IPage page, string name)
    {
        await Screens.TakeAllAsync(page, name);
        await Accessibility.AssertNoFindingsAsync(page);
        await page.EmulateMediaAsync(new() { ColorScheme = ColorScheme.Dark });
        await Accessibility.AssertNoFindingsAsync(page);
        await page.EmulateMediaAsync(new() { ColorScheme = ColorScheme.Light });
        await page.SetViewportSizeAsync(Screens.Phone.Width, Screens.Phone.Height);
        await Accessibility.AssertNoSidewaysScrollAsync(page);
        await page.SetViewportSizeAsync(Screens.Desk.Width, Screens.Desk.Height);
    }
}
