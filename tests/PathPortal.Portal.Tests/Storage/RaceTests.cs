using Microsoft.EntityFrameworkCore;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.People;
using PathPortal.Portal.Domain.Reviews;
using PathPortal.Portal.Handling.History;
using PathPortal.Portal.Handling.People;
using PathPortal.Portal.Handling.Programs;
using PathPortal.Portal.Handling.Reviews;
using PathPortal.Portal.Tests.Support;
using PathPortal.TestSupport;

namespace PathPortal.Portal.Tests.Storage;

/// <summary>Two at the same moment: one effect, and the other is told what happened.</summary>
public sealed class RaceTests
{
    private static readonly TimeSpan Patience = TimeSpan.FromSeconds(60);

    [Fact]
    public async Task Approve_ByTwoAtOnceWhereOneIsEnough_CountsOnce()
    {
        await using var scene = await PlantScene.CreateAsync();
        var review = await scene.SubmitAsync(1);

        var outcomes = await Task.WhenAll(scene.DecideAsync(review, scene.Lead), scene.DecideAsync(review, scene.CellOwner));

        Assert.Single(outcomes, o => o.Succeeded);
        Assert.Equal(RefusalKind.WrongState, outcomes.Single(o => !o.Succeeded).Refusal!.Kind);
        var after = await scene.ReviewAsync(review);
        Assert.Equal((ReviewState.Approved, 1, 1), (after.State, after.ApprovalsGiven, after.Decisions.Count));
        Assert.Null((await scene.Get<VerifyHistory>().HandleAsync(Actor.Process("test"))).Break);
    }

    [Fact]
    public async Task Approve_TwiceAtOnceByTheSamePerson_CountsOnce()
    {
        await using var scene = await PlantScene.CreateAsync(approvalsRequired: 2);
        var review = await scene.SubmitAsync(1);

        var outcomes = await Task.WhenAll(Enumerable.Range(0, 4).Select(_ => scene.DecideAsync(review, scene.Lead)));

        Assert.Single(outcomes, o => o.Succeeded);
        Assert.All(outcomes.Where(o => !o.Succeeded), o => Assert.Equal(RefusalKind.FourEyes, o.Refusal!.Kind));
        var after = await scene.ReviewAsync(review);
        Assert.Equal((ReviewState.InReview, 1), (after.State, after.ApprovalsGiven));
    }

    [Fact]
    public async Task Approve_ByTwoAtOnceWhereBothAreNeeded_LosesNeither()
    {
        await using var scene = await PlantScene.CreateAsync(approvalsRequired: 2);
        var review = await scene.SubmitAsync(1);

        var outcomes = await Task.WhenAll(scene.DecideAsync(review, scene.Lead), scene.DecideAsync(review, scene.CellOwner));

        Assert.All(outcomes, o => Assert.True(o.Succeeded, o.Refusal?.Message));
        Assert.Equal(ReviewState.Approved, (await scene.ReviewAsync(review)).State);
    }

    [Fact]
    public async Task Withdraw_WhileAnApprovalIsUnderWay_SeesItAndWithdrawsTheApproved()
    {
        await using var scene = await PlantScene.CreateAsync();
        var id = await scene.SubmitAsync(1);
        var evidence = await scene.EvidenceAsync(id);
        await using var approval = await scene.Db.OpenAsync(Actor.Of(scene.Lead.Id));
        var review = await approval.Db.Reviews.Include(r => r.Decisions).SingleAsync(r => r.Id == id);
        var request = await approval.Db.RunRequests.Select(r => r.Id).SingleAsync();
        Assert.True(review.Decide(DecisionKind.Approve, scene.Lead.Id, scene.Author.Id, evidence, request, "meaning", "", approval.Now).Succeeded);
        await approval.Db.SaveChangesAsync();

        var withdrawal = scene.Get<WithdrawReview>().HandleAsync(Actor.Of(scene.Author.Id), id, "a slip");
        await BlockedAsync(scene);
        await approval.CommitAsync();

        Assert.True((await withdrawal).Succeeded);
        var after = await scene.ReviewAsync(id);
        Assert.Equal(ReviewState.Withdrawn, after.State);
        Assert.Equal(ReviewState.Approved, after.Transitions.OrderBy(t => t.Number).Last().From);
    }

    [Fact]
    public async Task Approve_WhileTheRoleIsTaken_WaitsAndIsDenied()
    {
        await using var scene = await PlantScene.CreateAsync();
        var review = await scene.SubmitAsync(1);
        await using var taking = await scene.Db.OpenAsync(Actor.Of(scene.Administrator.Id));
        taking.Db.PlantRoles.Remove(await taking.Db.PlantRoles.SingleAsync(r => r.AccountId == scene.Lead.Id && r.Role == Role.Lead));
        await taking.Db.SaveChangesAsync();

        var approval = scene.DecideAsync(review, scene.Lead);
        await BlockedAsync(scene);
        await taking.CommitAsync();

        Assert.Equal(RefusalKind.NotFound, (await approval).Refusal?.Kind);
        Assert.Equal(ReviewState.InReview, (await scene.ReviewAsync(review)).State);
    }

    [Fact]
    public async Task Upload_ByTwoAtOnce_GivesTwoNumbers()
    {
        await using var scene = await PlantScene.CreateAsync();

        var uploads = await Task.WhenAll(scene.UploadAsync(1, scene.Author), scene.UploadAsync(2, scene.SecondAuthor));

        Assert.Equal([1, 2], uploads.Select(u => u.Number).Order());
    }

    [Fact]
    public async Task Upload_OfOneFileByTwoAtOnce_SharesItsRunOrIsRefused()
    {
        await using var scene = await PlantScene.CreateAsync();
        var upload = scene.Get<UploadRevision>();

        var results = await Task.WhenAll(new[] { scene.Author, scene.SecondAuthor }.Select(
            a => upload.HandleAsync(Actor.Of(a.Id), scene.Program.Id, "bead.csv", PlantScene.Path(1), "")));

        Assert.Single(results, r => r.Succeeded);
        Assert.Equal(1L, await scene.SqlAsync("SELECT count(*) FROM runs"));
        Assert.Equal(1L, await scene.SqlAsync("SELECT count(*) FROM revisions"));
    }

    [Fact]
    public async Task Decide_AccountDisabledMeanwhile_IsDenied()
    {
        await using var scene = await PlantScene.CreateAsync();
        var review = await scene.SubmitAsync(1);
        Assert.True((await scene.Get<DisableAccount>().HandleAsync(Actor.Of(scene.Company.Id), scene.Lead.Id, disabled: true)).Value);

        Assert.Equal(RefusalKind.NotAllowed, (await scene.DecideAsync(review, scene.Lead)).Refusal?.Kind);
    }

    // Somebody waits for a lock in this database.
    private static Task BlockedAsync(PlantScene scene) => Eventually.TrueAsync(
        "a transaction waits for another", Patience,
        async () => (bool)(await scene.SqlAsync(
            "SELECT EXISTS (SELECT FROM pg_stat_activity WHERE datname = current_database() AND wait_event_type = 'Lock')"))!,
        TestContext.Current.CancellationToken);
}
