using Microsoft.EntityFrameworkCore;
using PathPortal.Engine.Verdicts;
using PathPortal.Formats.Documents;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.Reviews;
using PathPortal.Portal.Handling.Fleet;
using PathPortal.Portal.Handling.History;
using PathPortal.Portal.Handling.Programs;
using PathPortal.Portal.Handling.Reviews;
using PathPortal.Portal.Tests.Jobs;
using PathPortal.Portal.Tests.Support;

namespace PathPortal.Portal.Tests.Handling;

public sealed class DecideReviewTests
{
    [Fact]
    public async Task Handle_ByAnother_ApprovesAndBindsToTheDigests()
    {
        await using var scene = await PlantScene.CreateAsync();
        var review = await scene.SubmitAsync(1);
        var shown = await scene.EvidenceAsync(review);

        var decided = await scene.DecideAsync(review, scene.Lead);

        Assert.Equal(ReviewState.Approved, decided.Value);
        var after = await scene.ReviewAsync(review);
        var decision = Assert.Single(after.Decisions);
        Assert.Equal(shown, decision.Evidence);
        Assert.Equal(DecisionMeaning.Of(DecisionKind.Approve), decision.Meaning);
        var told = await scene.Db.ReadAsync(Actor.Process("test"), s => s.Db.History.OrderBy(e => e.Sequence).ToListAsync());
        Assert.Equal(["uploaded", "submitted", "approved"], told.Select(e => e.Action));
        Assert.Equal(scene.Lead.Id, told[^1].ActorId);
        Assert.Equal(scene.Lead.DisplayName, told[^1].ActorName);
        Assert.Null((await scene.Get<VerifyHistory>().HandleAsync(Actor.Process("test"))).Break);
    }

    [Fact]
    public async Task Handle_ByUploaderOrSubmitter_IsRefusedWhateverTheirRoles()
    {
        await using var scene = await PlantScene.CreateAsync();
        var review = await scene.SubmitAsync(1, uploader: scene.Lead, submitter: scene.SecondLead);
        Assert.Equal(RefusalKind.FourEyes, (await scene.DecideAsync(review, scene.Lead)).Refusal?.Kind);
        Assert.Equal(RefusalKind.FourEyes, (await scene.DecideAsync(review, scene.SecondLead)).Refusal?.Kind);
        Assert.True((await scene.DecideAsync(review, scene.CellOwner)).Succeeded);
    }

    [Fact]
    public async Task Handle_WithoutFreshProof_IsRefused()
    {
        await using var scene = await PlantScene.CreateAsync();
        var review = await scene.SubmitAsync(1);
        var decision = new ReviewDecision(review, DecisionKind.Approve, await scene.EvidenceAsync(review), "");
        var decide = scene.Get<DecideReview>();
        var old = PlantScene.Signed(scene.Lead) with { At = TimeProvider.System.GetUtcNow() - Reauthentication.Lifetime - TimeSpan.FromSeconds(1) };

        foreach (var proof in new[] { old, PlantScene.Signed(scene.SecondLead) })
            Assert.Equal(RefusalKind.NotReauthenticated, (await decide.HandleAsync(Actor.Of(scene.Lead.Id), decision, proof)).Refusal?.Kind);
    }

    [Fact]
    public async Task Handle_ControllerFileAttachedMeanwhile_SaysWhatChanged()
    {
        await using var scene = await PlantScene.CreateAsync();
        var review = await scene.SubmitAsync(1);
        var shown = await scene.EvidenceAsync(review);
        var revision = (await scene.ReviewAsync(review)).RevisionId;
        var attached = await scene.Get<AttachControllerFile>().HandleAsync(Actor.Of(scene.CellOwner.Id), revision, scene.Cell.Id, "bead.prg", [1, 2, 3]);
        Assert.True(attached.Succeeded, attached.Refusal?.Message);

        var refusal = (await scene.DecideAsync(review, scene.Lead, shown: shown)).Refusal;

        Assert.Equal(RefusalKind.Stale, refusal?.Kind);
        Assert.Contains("the controller file", refusal!.Message, StringComparison.Ordinal);
        Assert.True((await scene.DecideAsync(review, scene.Lead)).Succeeded);
    }

    [Fact]
    public async Task Handle_SetupSavedMeanwhile_CanOnlyBeRejected()
    {
        await using var scene = await PlantScene.CreateAsync();
        var review = await scene.SubmitAsync(1);
        var shown = await scene.EvidenceAsync(review);
        var setup = CellSetupDocument.Read(JobScene.SetupJson(7)).Value!;
        var saved = await scene.Get<SaveCellSetup>().HandleAsync(Actor.Of(scene.CellOwner.Id), scene.Cell.Id, 1, scene.ArmVersion.Id, setup, "moved");
        Assert.True(saved.Succeeded, saved.Refusal?.Message);

        var refusal = (await scene.DecideAsync(review, scene.Lead, shown: shown)).Refusal;

        Assert.Equal(RefusalKind.WrongState, refusal?.Kind);
        Assert.Contains("setup", refusal!.Message, StringComparison.Ordinal);
        Assert.Equal(ReviewState.Rejected, (await scene.DecideAsync(review, scene.Lead, DecisionKind.Reject, shown)).Value);
    }

    [Theory]
    [InlineData(Verdict.Fail)]
    [InlineData(Verdict.NotAssessable)]
    public async Task Handle_RunThatDoesNotPass_CanOnlyBeRejected(Verdict verdict)
    {
        await using var scene = await PlantScene.CreateAsync();
        var review = await scene.SubmitAsync(1, verdict: verdict);
        Assert.Equal(RefusalKind.WrongState, (await scene.DecideAsync(review, scene.Lead)).Refusal?.Kind);
        Assert.Equal(ReviewState.Rejected, (await scene.DecideAsync(review, scene.Lead, DecisionKind.Reject)).Value);
    }

    [Fact]
    public async Task Submit_WithoutFinishedRun_IsRefused()
    {
        await using var scene = await PlantScene.CreateAsync();
        var revision = await scene.UploadAsync(1);
        var outcome = await scene.Get<SubmitForReview>().HandleAsync(Actor.Of(scene.Author.Id), revision.Id, scene.Assignment.Id, "");
        Assert.Equal(RefusalKind.WrongState, outcome.Refusal?.Kind);
    }

    [Fact]
    public async Task Submit_NewerRevision_SupersedesTheOneInReview()
    {
        await using var scene = await PlantScene.CreateAsync();
        var first = await scene.SubmitAsync(1);
        var second = await scene.SubmitAsync(2);
        Assert.Equal(ReviewState.Superseded, (await scene.ReviewAsync(first)).State);
        Assert.Equal(ReviewState.InReview, (await scene.ReviewAsync(second)).State);
        Assert.Equal(RefusalKind.WrongState, (await scene.DecideAsync(first, scene.Lead)).Refusal?.Kind);
    }

    [Fact]
    public async Task Attach_AfterApproval_IsRefused()
    {
        await using var scene = await PlantScene.CreateAsync();
        var review = await scene.SubmitAsync(1);
        await scene.DecideAsync(review, scene.Lead);
        var revision = (await scene.ReviewAsync(review)).RevisionId;
        var outcome = await scene.Get<AttachControllerFile>().HandleAsync(Actor.Of(scene.CellOwner.Id), revision, scene.Cell.Id, "bead.prg", [1]);
        Assert.Equal(RefusalKind.WrongState, outcome.Refusal?.Kind);
    }
}
