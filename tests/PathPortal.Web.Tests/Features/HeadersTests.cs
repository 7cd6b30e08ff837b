using System.Net;
using System.Text.RegularExpressions;
using PathPortal.TestSupport;
using PathPortal.Web.Tests.Support;

namespace PathPortal.Web.Tests.Features;

public sealed partial class HeadersTests(SiteFixture fixture) : IClassFixture<SiteFixture>
{
    private readonly PortalSite _site = fixture.Site;

    [Theory]
    [InlineData("/sign-in", HttpStatusCode.OK)]
    [InlineData("/", HttpStatusCode.Redirect)]
    [InlineData("/css/app.css", HttpStatusCode.OK)]
    [InlineData("/health/live", HttpStatusCode.OK)]
    [InlineData("/nothing/here", HttpStatusCode.Redirect)]
    [InlineData("/not-found", HttpStatusCode.OK)]
    public async Task Get_AnyAnswer_CarriesTheSecurityHeaders(string path, HttpStatusCode status)
    {
        using var visitor = _site.Visit();
        var answer = await visitor.GetAsync(path);
        Assert.Equal(status, answer.Status);
        Assert.Equal("nosniff", Header(answer, "X-Content-Type-Options"));
        var policy = Header(answer, "Content-Security-Policy");
        Assert.Contains("frame-ancestors 'none'", policy, StringComparison.Ordinal);
        Assert.Contains("style-src 'self' 'unsafe-inline';", policy, StringComparison.Ordinal);
        Assert.Contains("img-src 'self' data: blob:;", policy, StringComparison.Ordinal);
        Assert.Matches(@"script-src 'self' 'nonce-[A-Za-z0-9+/=]{24}';", policy);
        Assert.DoesNotContain("unsafe-eval", policy, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Get_Page_HasNoInlineScriptBesideTheImportMapAndNoHandlers()
    {
        using var visitor = _site.Visit();
        var answer = await visitor.GetAsync("/sign-in");
        var inline = answer.Document.QuerySelectorAll("script:not([src])");
        var map = Assert.Single(inline);
        Assert.Equal("importmap", map.GetAttribute("type"));
        Assert.Contains($"'nonce-{map.GetAttribute("nonce")}'", Header(answer, "Content-Security-Policy"), StringComparison.Ordinal);
        Assert.DoesNotContain(answer.Document.All, e => e.Attributes.Any(a => a.Name.StartsWith("on", StringComparison.OrdinalIgnoreCase)));
    }

    [Fact]
    public async Task Get_Twice_NonceDiffers()
    {
        using var visitor = _site.Visit();
        var nonces = new[] { await visitor.GetAsync("/sign-in"), await visitor.GetAsync("/sign-in") }
            .Select(a => Nonce().Match(Header(a, "Content-Security-Policy")).Value).ToArray();
        Assert.NotEqual(nonces[0], nonces[1]);
    }

    [Fact]
    public async Task Get_NothingThere_SaysSoInHtml()
    {
        await _site.People.AccountAsync("lost@plant.example", "Lost");
        using var visitor = _site.Visit();
        await visitor.SignInAsync("lost@plant.example");
        var answer = await visitor.GetAsync("/nothing/here");
        Assert.Equal(HttpStatusCode.NotFound, answer.Status);
        Assert.Contains("There is nothing at this address", answer.Text, StringComparison.Ordinal);
        Assert.NotNull(answer.Document.QuerySelector("title"));
    }

    [Fact]
    public async Task Health_DatabaseThere_IsReady()
    {
        using var visitor = _site.Visit();
        Assert.Equal("ready", (await visitor.GetAsync("/health/ready")).Body);
    }

    [Fact]
    public async Task DatabaseDown_LiveButNotReadyAndPagesSaySo()
    {
        await using var database = await TestDatabase.CreateAsync();
        await using var site = new PortalSite(database, ("ConnectionStrings:Portal", "Host=127.0.0.1;Port=1;Database=none;Username=none;Password=none"));
        using var visitor = site.Visit();
        Assert.Equal(HttpStatusCode.OK, (await visitor.GetAsync("/health/live")).Status);
        Assert.Equal(HttpStatusCode.ServiceUnavailable, (await visitor.GetAsync("/health/ready")).Status);
        var answer = await visitor.SignInAsync("anybody@plant.example");
        Assert.Equal(HttpStatusCode.ServiceUnavailable, answer.Status);
        Assert.Contains("The database does not answer", answer.Text, StringComparison.Ordinal);
        Assert.Equal("nosniff", Header(answer, "X-Content-Type-Options"));
    }

    [Theory]
    [InlineData("dark")]
    [InlineData("light")]
    public async Task Theme_Chosen_IsInTheNextPage(string theme)
    {
        using var visitor = _site.Visit();
        var page = await visitor.GetAsync("/sign-in");
        Assert.Null(page.Document.DocumentElement.GetAttribute("data-theme"));
        await visitor.SubmitAsync(page, "form[action='/preferences/theme']", ("theme", theme));
        Assert.Equal(theme, (await visitor.GetAsync("/sign-in")).Document.DocumentElement.GetAttribute("data-theme"));
    }

    private static string Header(Visitor.Answer answer, string name) => Assert.Single(answer.Response.Headers.GetValues(name));

    [GeneratedRegex("nonce-[^']+")]
    private static partial Regex Nonce();
}
