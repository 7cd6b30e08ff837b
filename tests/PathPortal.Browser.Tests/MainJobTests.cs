using System.Text;
using Microsoft.Extensions.DependencyInjection;
using Microsoft.Playwright;
using PathPortal.Browser.Tests.Support;
using PathPortal.Portal.Data;
using PathPortal.Portal.Demo;
using PathPortal.Portal.Handling;
using PathPortal.Portal.Jobs;
using PathPortal.TestSupport;

namespace PathPortal.Browser.Tests;

/// <summary>
/// The job the portal is for, in a real browser, on a real database, with a real worker process: one account uploads a path and submits it,
/// the verdict comes from the worker, another account approves. Takes the picture README shows.
/// </summary>
public sealed class MainJobTests(Chromium chromium, BrowserSite site) : IClassFixture<BrowserSite>
{
    private const string Author = "asta@demo.example";
    private const string Approver = "doran@demo.example";
    private const string Program = "Door frame seal bead";

    // Far beyond what the runs of an upload take, also behind those of the demo; the bound only ends a test that would hang.
    private const int Patience = 300_000;

    [Fact]
    public async Task Upload_ByAnAuthor_IsSimulatedSubmittedAndApprovedByAnother()
    {
        var passwords = await LoadDemoAsync();
        using var worker = WorkerProcess.Start(site.Site.Database.Worker);

        var author = await SignInAsync(Author, passwords);
        await author.GetByRole(AriaRole.Link, new() { Name = Program }).First.ClickAsync();
        await RefuseBrokenFileAsync(author);
        await UploadAsync(author);
        var row = author.Locator("tr", new() { Has = author.GetByRole(AriaRole.Link, new() { Name = "Seal 1", Exact = true }) }).First;
        await Assertions.Expect(row.GetByText("passes")).ToBeVisibleAsync(new() { Timeout = Patience });

        var program = author.Url;
        await row.Locator("a[href^='/runs/']").First.ClickAsync();
        await Assertions.Expect(author.GetByRole(AriaRole.Heading, new() { Name = "Limit use along the run" })).ToBeVisibleAsync();
        await Assertions.Expect(author.GetByText("Not checked here")).ToBeVisibleAsync();

        await author.GotoAsync(program);
        // The row is replaced whenever a run makes progress, so the link is followed by its address.
        await author.GotoAsync((await row.GetByRole(AriaRole.Link, new() { Name = "Submit for review" }).GetAttributeAsync("href"))!);
        await Screens.TakeAsync(author, "main-job-submit");
        await author.GetByLabel("To whoever decides").FillAsync("Slower over the hinge boss.");
        await author.GetByRole(AriaRole.Button, new() { Name = "Submit for review" }).ClickAsync();
        await author.WaitForURLAsync("**/reviews/*");
        // The author sees the review but has nothing to sign.
        await Assertions.Expect(author.GetByLabel("Your password, again")).Not.ToBeVisibleAsync();
        await Screens.TakeAsync(author, "main-job-author");

        var approver = await SignInAsync(Approver, passwords);
        await approver.GotoAsync(new Uri(author.Url).AbsolutePath);
        await SignAsync(approver, "not-the-password");
        await Assertions.Expect(approver.GetByText("The password was not accepted")).ToBeVisibleAsync();
        await SignAsync(approver, passwords[Approver]);
        await Assertions.Expect(approver.Locator(".page-head").GetByText("approved")).ToBeVisibleAsync();
        await Screens.TakeAsync(approver, "main-job-approved");
        await Accessibility.AssertNoFindingsAsync(approver);

        await PictureForReadmeAsync(passwords);
    }

    private static async Task SignAsync(IPage page, string password)
    {
        await page.GetByRole(AriaRole.Radio, new() { Name = "Approve." }).CheckAsync();
        await page.GetByLabel("Your password, again").FillAsync(password);
        await page.GetByRole(AriaRole.Button, new() { Name = "Sign", Exact = true }).ClickAsync();
    }

    private static async Task RefuseBrokenFileAsync(IPage page)
    {
        await page.GetByRole(AriaRole.Link, new() { Name = "Upload a revision" }).ClickAsync();
        await SendAsync(page, "broken.csv", Encoding.UTF8.GetBytes("x_mm,y_mm,z_mm,qw,qx,qy,qz\n0,0,0,1,0,0,0\n\"1,5\",0,0,1,0,0,0\n"));
        await Assertions.Expect(page.GetByText("broken.csv cannot be used as it is; nothing was stored")).ToBeVisibleAsync();
        await Screens.TakeAsync(page, "main-job-refused");
    }

    private static async Task UploadAsync(IPage page)
    {
        // The demo's second revision at a calmer speed.
        var text = Encoding.UTF8.GetString(DemoPrograms.Read("door-frame-seal-2.csv")).Replace(",32,", ",24,", StringComparison.Ordinal);
        await SendAsync(page, "door-frame-seal-3.csv", Encoding.UTF8.GetBytes(text));
        await Assertions.Expect(page.GetByRole(AriaRole.Heading, new() { Name = "Revision 3 on its cells" })).ToBeVisibleAsync();
    }

    private static async Task SendAsync(IPage page, string name, byte[] bytes)
    {
        await page.GetByLabel("File", new() { Exact = true }).SetInputFilesAsync(new FilePayload { Name = name, MimeType = "text/csv", Buffer = bytes });
        await page.GetByRole(AriaRole.Button, new() { Name = "Upload and simulate" }).ClickAsync();
    }

    /// <summary>The run that fails on Seal 4, as the lead engineer sees it.</summary>
    private async Task PictureForReadmeAsync(IReadOnlyDictionary<string, string> passwords)
    {
        var lead = await SignInAsync("fenja@demo.example", passwords);
        await lead.GetByRole(AriaRole.Link, new() { Name = Program }).First.ClickAsync();
        await lead.GetByRole(AriaRole.Link, new() { Name = "2", Exact = true }).First.ClickAsync();
        var row = lead.Locator("tr", new() { Has = lead.GetByRole(AriaRole.Link, new() { Name = "Seal 4", Exact = true }) }).First;
        await Assertions.Expect(row.GetByText("fails")).ToBeVisibleAsync(new() { Timeout = Patience });
        await row.Locator("a[href^='/runs/']").First.ClickAsync();
        await Assertions.Expect(lead.GetByText("Joint speed asked for")).ToBeVisibleAsync();
        await lead.WaitForLoadStateAsync(LoadState.NetworkIdle);
        await Screens.TakeAsync(lead, "run-page", fullPage: false);
    }

    private async Task<IPage> SignInAsync(string email, IReadOnlyDictionary<string, string> passwords)
    {
        var page = await site.OpenAsync(chromium, "/sign-in");
        await page.GetByLabel("E-mail address").FillAsync(email);
        await page.GetByLabel("Password").FillAsync(passwords[email]);
        await page.GetByRole(AriaRole.Button, new() { Name = "Sign in" }).ClickAsync();
        await page.WaitForURLAsync(url => !url.Contains("/sign-in", StringComparison.Ordinal));
        return page;
    }

    private async Task<IReadOnlyDictionary<string, string>> LoadDemoAsync()
    {
        var folder = Directory.CreateTempSubdirectory("pathportal-main-job-");
        try
        {
            var file = Path.Combine(folder.FullName, "passwords");
            await using var services = new ServiceCollection()
                .AddLogging().AddPortalData(site.Site.Database.Owner).AddRunQueue().AddPortalHandlers().AddDemo().BuildServiceProvider();
            await using var scope = services.CreateAsyncScope();
            await scope.ServiceProvider.GetRequiredService<DemoLoader>().LoadAsync(file, TestContext.Current.CancellationToken);
            return File.ReadAllLines(file).Where(l => !l.StartsWith('#')).Select(l => l.Split(' ', StringSplitOptions.RemoveEmptyEntries))
                .ToDictionary(w => w[0], w => w[1]);
        }
        finally
        {
            folder.Delete(recursive: true);
        }
    }
}
