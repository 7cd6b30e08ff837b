using System.Net;
using Microsoft.EntityFrameworkCore;
using PathPortal.Portal.Domain.Reviews;
using PathPortal.TestSupport;
using PathPortal.Web.Tests.Support;

namespace PathPortal.Web.Tests.Features;

public sealed class ReviewTests : IAsyncLifetime
{
    private PortalSite _site = null!;
    private SampleCompany _company = null!;

    public async ValueTask InitializeAsync()
    {
        _site = new PortalSite(await TestDatabase.CreateAsync());
        _company = await SampleCompany.MakeAsync(_site.People);
    }

    public async ValueTask DisposeAsync()
    {
        await _site.DisposeAsync();
        await _site.Database.DisposeAsync();
    }

    [Fact]
    public async Task Approve_SecondPersonWithPassword_IsApprovedAndInTheHistory()
    {
        using var owner = await SignedInAsync("owner@plant.example");
        var page = await owner.GetAsync(Path(_company.InReview));
        Assert.Contains("Collisions", page.Text, StringComparison.Ordinal);
        var answer = await DecideAsync(owner, page, "approve");
        Assert.True(answer.Status == HttpStatusCode.Redirect, answer.Text);
        Assert.Equal(ReviewState.Approved, await StateAsync(_company.InReview));
        Assert.Contains("approved", (await owner.GetAsync("/history?kind=review")).Text, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Approve_WrongPassword_ChangesNothing()
    {
        using var owner = await SignedInAsync("owner@plant.example");
        var answer = await DecideAsync(owner, await owner.GetAsync(Path(_company.InReview)), "approve", password: "not the password");
        Assert.Contains("The password was not accepted", answer.Text, StringComparison.Ordinal);
        Assert.Equal(ReviewState.InReview, await StateAsync(_company.InReview));
    }

    [Fact]
    public async Task Approve_ForgedFormOfTheSubmitter_NeedsASecondPerson()
    {
        using var lead = await SignedInAsync("lead@plant.example");
        var page = await lead.GetAsync(Path(_company.LeadsReview));
        Assert.Null(page.Document.QuerySelector("#decide-password"));
        // The form as the cell owner sees it, sent by the submitter.
        using var owner = await SignedInAsync("owner@plant.example");
        var form = FieldsOf(await owner.GetAsync(Path(_company.LeadsReview)));
        form["__RequestVerificationToken"] = page.Document.QuerySelector("input[name=__RequestVerificationToken]")!.GetAttribute("value")!;
        form["DecideForm.Kind"] = "approve";
        form["DecideForm.Password"] = People.Password;
        var answer = await lead.PostAsync(Path(_company.LeadsReview), form);
        Assert.Contains("A second person has to do this", answer.Text, StringComparison.Ordinal);
        Assert.Equal(ReviewState.InReview, await StateAsync(_company.LeadsReview));
    }

    [Fact]
    public async Task Approve_DigestOfAnotherRun_IsStale()
    {
        using var owner = await SignedInAsync("owner@plant.example");
        var page = await owner.GetAsync(Path(_company.InReview));
        var answer = await DecideAsync(owner, page, "approve", ("DecideForm.RunDigest", new string('0', 64)));
        Assert.Contains("the run changed", answer.Text, StringComparison.Ordinal);
        Assert.Equal(ReviewState.InReview, await StateAsync(_company.InReview));
    }

    [Fact]
    public async Task Approve_FailingRunByForgedChoice_IsRefused()
    {
        using var owner = await SignedInAsync("owner@plant.example");
        var page = await owner.GetAsync(Path(_company.FailingReview));
        Assert.True(page.Document.QuerySelector("input[value=approve]")!.HasAttribute("disabled"));
        var answer = await DecideAsync(owner, page, "approve");
        Assert.Contains("does not pass every binding criterion", answer.Text, StringComparison.Ordinal);
        Assert.Equal(ReviewState.InReview, await StateAsync(_company.FailingReview));
    }

    [Fact]
    public async Task Reject_WithAndWithoutReason_OnlyWithReason()
    {
        using var owner = await SignedInAsync("owner@plant.example");
        var page = await owner.GetAsync(Path(_company.FailingReview));
        var without = await DecideAsync(owner, page, "reject");
        Assert.Contains("A rejection needs a reason", without.Text, StringComparison.Ordinal);
        var with = await DecideAsync(owner, without, "reject", ("DecideForm.Reason", "Joint 5 too close to its limit."));
        Assert.True(with.Status == HttpStatusCode.Redirect, with.Text);
        Assert.Equal(ReviewState.Rejected, await StateAsync(_company.FailingReview));
        using var author = await SignedInAsync("author@plant.example");
        Assert.Contains("rejected by Owen Owner", (await author.GetAsync("/")).Text, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Get_StrangerToThePlant_FindsNothing()
    {
        using var stranger = await SignedInAsync("stranger@plant.example");
        Assert.Equal(HttpStatusCode.NotFound, (await stranger.GetAsync(Path(_company.InReview))).Status);
        Assert.Equal(HttpStatusCode.NotFound, (await stranger.GetAsync($"/programs/{_company.Sealing.Id}")).Status);
        Assert.DoesNotContain("Door seam", (await stranger.GetAsync("/")).Body, StringComparison.Ordinal);
        Assert.DoesNotContain("Door seam", (await stranger.GetAsync("/history")).Body, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Post_WithoutToken_IsRefused()
    {
        using var owner = await SignedInAsync("owner@plant.example");
        var form = FieldsOf(await owner.GetAsync(Path(_company.InReview)));
        form.Remove("__RequestVerificationToken");
        form["DecideForm.Kind"] = "approve";
        form["DecideForm.Password"] = People.Password;
        Assert.Equal(HttpStatusCode.BadRequest, (await owner.PostAsync(Path(_company.InReview), form)).Status);
        Assert.Equal(ReviewState.InReview, await StateAsync(_company.InReview));
    }

    private static string Path(Review review) => $"/reviews/{review.Id}";

    private static Dictionary<string, string> FieldsOf(Visitor.Answer page) =>
        Visitor.FieldsOf((AngleSharp.Html.Dom.IHtmlFormElement)page.Document.QuerySelector("form:has(#decide-password)")!);

    private static Task<Visitor.Answer> DecideAsync(Visitor visitor, Visitor.Answer page, string kind, (string, string)? more = null, string password = People.Password)
    {
        var form = FieldsOf(page);
        form["DecideForm.Kind"] = kind;
        form["DecideForm.Password"] = password;
        if (more is var (name, value))
            form[name] = value;
        return visitor.PostAsync(page.Path, form);
    }

    private async Task<Visitor> SignedInAsync(string email)
    {
        var visitor = _site.Visit();
        await visitor.SignInAsync(email);
        return visitor;
    }

    private async Task<ReviewState> StateAsync(Review review)
    {
        var state = default(ReviewState);
        await _site.People.ChangeAsync(async session => state = await session.Db.Reviews.Where(r => r.Id == review.Id).Select(r => r.State).SingleAsync());
        return state;
    }
}
