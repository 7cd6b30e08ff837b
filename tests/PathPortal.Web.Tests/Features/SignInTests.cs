using System.Net;
using PathPortal.Portal.Domain.People;
using PathPortal.TestSupport;
using PathPortal.Web.Tests.Support;

namespace PathPortal.Web.Tests.Features;

public sealed class SignInTests(SiteFixture fixture) : IClassFixture<SiteFixture>
{
    private readonly PortalSite _site = fixture.Site;

    [Theory]
    [InlineData("/")]
    [InlineData("/programs")]
    [InlineData("/programs/01890000-0000-7000-8000-000000000000")]
    [InlineData("/history")]
    [InlineData("/setup")]
    [InlineData("/programs/01890000-0000-7000-8000-000000000000/revisions/01890000-0000-7000-8000-000000000000/cells")]
    public async Task Get_Stranger_IsSentToSignIn(string path)
    {
        using var visitor = _site.Visit();
        var answer = await visitor.GetAsync(path);
        Assert.Equal(HttpStatusCode.Redirect, answer.Status);
        Assert.StartsWith("/sign-in?returnUrl=", new Uri(answer.Location!, UriKind.RelativeOrAbsolute) is { IsAbsoluteUri: true } uri ? uri.PathAndQuery : answer.Location, StringComparison.Ordinal);
    }

    [Fact]
    public async Task SignIn_RightPassword_OpensThePageAskedFor()
    {
        await _site.People.AccountAsync("right@plant.example", "Ria Right");
        using var visitor = _site.Visit();
        var answer = await visitor.SignInAsync("right@plant.example", path: "/sign-in?returnUrl=%2Fprograms");
        Assert.Equal(HttpStatusCode.Redirect, answer.Status);
        Assert.EndsWith("/programs", answer.Location, StringComparison.Ordinal);
        var page = await visitor.GetAsync("/programs");
        Assert.Equal(HttpStatusCode.OK, page.Status);
        Assert.Contains("Ria Right", page.Body, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("https://elsewhere.example/")]
    [InlineData("//elsewhere.example/")]
    [InlineData("/\\elsewhere.example/")]
    public async Task SignIn_ReturnElsewhere_StaysHere(string returnUrl)
    {
        var email = $"stay{Guid.NewGuid():N}@plant.example";
        await _site.People.AccountAsync(email, "Stay Here");
        using var visitor = _site.Visit();
        var answer = await visitor.SignInAsync(email, path: "/sign-in?returnUrl=" + Uri.EscapeDataString(returnUrl));
        Assert.Equal(HttpStatusCode.Redirect, answer.Status);
        Assert.DoesNotContain("elsewhere", answer.Location, StringComparison.Ordinal);
    }

    [Fact]
    public async Task SignIn_SessionCookie_IsHttpOnlyAndSameSite()
    {
        await _site.People.AccountAsync("cookie@plant.example", "Co Okie");
        using var visitor = _site.Visit();
        var answer = await visitor.SignInAsync("cookie@plant.example");
        var cookie = Assert.Single(answer.Response.Headers.GetValues("Set-Cookie"), c => c.StartsWith("pathportal.session=", StringComparison.Ordinal));
        Assert.Contains("httponly", cookie, StringComparison.OrdinalIgnoreCase);
        Assert.Contains("samesite=lax", cookie, StringComparison.OrdinalIgnoreCase);
    }

    [Fact]
    public async Task SignIn_WrongPasswordAndUnknownAddress_SaysTheSame()
    {
        await _site.People.AccountAsync("known@plant.example", "Known");
        using var visitor = _site.Visit();
        var known = await visitor.SignInAsync("known@plant.example", "not the password at all");
        var unknown = await visitor.SignInAsync("unknown@plant.example", "not the password at all");
        Assert.Equal(HttpStatusCode.OK, known.Status);
        Assert.Equal(known.Document.QuerySelector("[role=alert]")!.TextContent.Trim(), unknown.Document.QuerySelector("[role=alert]")!.TextContent.Trim());
    }

    [Fact]
    public async Task SignIn_TenWrongPasswords_LocksEvenTheRightOneOut()
    {
        await _site.People.AccountAsync("guessed@plant.example", "Guessed");
        using var visitor = _site.Visit();
        for (var i = 0; i < 10; i++)
            await visitor.SignInAsync("guessed@plant.example", $"wrong password number {i}");
        var answer = await visitor.SignInAsync("guessed@plant.example");
        Assert.Equal(HttpStatusCode.OK, answer.Status);
        Assert.Contains("Too many wrong passwords", answer.Text, StringComparison.Ordinal);
    }

    [Fact]
    public async Task SignIn_DisabledAccount_IsRefused()
    {
        var account = await _site.People.AccountAsync("gone@plant.example", "Gone");
        await DisableAsync(account);
        using var visitor = _site.Visit();
        var answer = await visitor.SignInAsync("gone@plant.example");
        Assert.Contains("may not sign in", answer.Text, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Get_AccountDisabledInMidSession_IsSentOutAtTheNextRequest()
    {
        var account = await _site.People.AccountAsync("mid@plant.example", "Mid Session");
        using var visitor = _site.Visit();
        await visitor.SignInAsync("mid@plant.example");
        Assert.Equal(HttpStatusCode.OK, (await visitor.GetAsync("/")).Status);
        await DisableAsync(account);
        Assert.Equal(HttpStatusCode.Redirect, (await visitor.GetAsync("/")).Status);
    }

    [Fact]
    public async Task SignOut_Post_EndsTheSession()
    {
        await _site.People.AccountAsync("out@plant.example", "Out");
        using var visitor = _site.Visit();
        await visitor.SignInAsync("out@plant.example");
        var page = await visitor.GetAsync("/");
        await visitor.SubmitAsync(page, "form[action='/account/sign-out']");
        Assert.Equal(HttpStatusCode.Redirect, (await visitor.GetAsync("/")).Status);
    }

    [Theory]
    [InlineData("/account/sign-out")]
    [InlineData("/preferences/theme")]
    public async Task Post_WithoutTheFormsToken_IsRefused(string path)
    {
        await _site.People.AccountAsync($"forged{path.Length}@plant.example", "Forged");
        using var visitor = _site.Visit();
        await visitor.SignInAsync($"forged{path.Length}@plant.example");
        var answer = await visitor.PostAsync(path, [new("theme", "dark")]);
        Assert.Equal(HttpStatusCode.BadRequest, answer.Status);
        Assert.Contains("The form was not accepted", answer.Text, StringComparison.Ordinal);
        Assert.Equal(HttpStatusCode.OK, (await visitor.GetAsync("/")).Status);
    }

    [Fact]
    public async Task SignIn_ManyPostsFromOneAddress_AreLimited()
    {
        await using var database = await TestDatabase.CreateAsync();
        await using var site = new PortalSite(database, ("SignIn:PostsPerMinute", "3"));
        using var visitor = site.Visit();
        for (var i = 0; i < 3; i++)
            Assert.Equal(HttpStatusCode.OK, (await visitor.SignInAsync($"nobody{i}@plant.example")).Status);
        var answer = await visitor.SignInAsync("nobody@plant.example");
        Assert.Equal(HttpStatusCode.TooManyRequests, answer.Status);
        Assert.Contains("Too many attempts", answer.Text, StringComparison.Ordinal);
        Assert.Equal(HttpStatusCode.OK, (await visitor.GetAsync("/sign-in")).Status);
    }

    private Task DisableAsync(Account account) => _site.People.ChangeAsync(async session =>
    {
        var found = await session.Db.Users.FindAsync(account.Id);
        found!.Disable(session.Now);
    });
}
