using System.Globalization;
using Microsoft.EntityFrameworkCore;
using PathPortal.Engine.Verdicts;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.History;
using PathPortal.Portal.Domain.People;
using PathPortal.Portal.Domain.Reviews;
using PathPortal.Portal.Simulation;

namespace PathPortal.Portal.Handling.Reviews;

/// <summary>
/// Approves or rejects a revision on a cell: by somebody else than uploader and submitter, signed in again just now, on exactly the digests
/// that were shown.
/// </summary>
public sealed class DecideReview(PortalDb db, DecisionSamples samples)
{
    private const string What = "review";

    /// <returns>The state the review is in afterwards.</returns>
    public async Task<Outcome<ReviewState>> HandleAsync(
        Actor actor, ReviewDecision decision, Reauthentication proof, CancellationToken cancellation = default)
    {
        ArgumentNullException.ThrowIfNull(decision);
        ArgumentNullException.ThrowIfNull(proof);
        var noted = Names.Note(decision.Reason);
        if (!noted.Succeeded)
            return noted.Refusal;
        // Computed before the transaction, which must be short; kept only when the decision comes to rest on that very run.
        var run = await db.ReadAsync(actor, session => RunOfAsync(session, decision.ReviewId, cancellation), cancellation);
        Outcome<byte[]>? packed = run is { } runId ? await samples.PackAsync(runId, cancellation) : null;
        return await db.ActAsync<ReviewState>(actor, async session =>
        {
            var data = session.Db;
            var access = await session.AccessAsync(cancellation);
            var review = await data.Reviews.Include(r => r.Decisions).SingleOrDefaultAsync(r => r.Id == decision.ReviewId, cancellation);
            if (review is null)
                return Refusal.NotFound(What);
            if (access.Refuse(review.PlantId, Right.Read, What) is { } refusal)
                return refusal;
            var plant = await data.Plants.SingleAsync(p => p.Id == review.PlantId, cancellation);
            if (!plant.MayApprove(access))
                return new Refusal(RefusalKind.NotAllowed, $"In this plant {string.Join(" or ", plant.ApprovingRoles)} decides on reviews.");
            if (!proof.Covers(access.AccountId, session.Now))
                return new Refusal(RefusalKind.NotReauthenticated, "Give your password again to sign this decision.");

            // Setup and criteria can't move on while the decision is being written.
            await LockEvidenceAsync(data, review, cancellation);
            var evidence = await EvidenceReader.ReadAsync(data, review.RevisionId, review.AssignmentId, cancellation);
            if (review.State == ReviewState.InReview && RefuseEvidence(evidence, decision, review) is { } unfit)
                return unfit;
            var revision = await data.Revisions.Where(r => r.Id == review.RevisionId)
                .Select(r => new { r.Number, r.UploadedBy, Program = data.Programs.Single(p => p.Id == r.ProgramId).Name }).SingleAsync(cancellation);
            if (evidence is not { RunRequestId: { } request, Digests: { } digests })
                return new Refusal(RefusalKind.WrongState, evidence.NotUsable ?? "There is no run to decide on.");

            if (evidence.RunId != run)
                return new Refusal(RefusalKind.Stale, "The run changed at this moment. Look at the review again before you decide.");
            if (decision.Kind == DecisionKind.Approve && packed is { Succeeded: false, Refusal: var unkept })
                return unkept;

            var decided = review.Decide(
                decision.Kind, access.AccountId, revision.UploadedBy, digests, request, DecisionMeaning.Of(decision.Kind), noted.Value, session.Now);
            if (!decided.Succeeded)
                return decided.Refusal;
            if (packed is { Succeeded: true, Value: { Length: > 0 } bytes })
                decided.Value.KeepSamples(bytes);
            session.Tell(HistoryDraft.Of(review.PlantId, What, review.Id, decision.Kind == DecisionKind.Approve ? "approved" : "rejected",
                ("program", revision.Program), ("revision", revision.Number.ToString(CultureInfo.InvariantCulture)),
                ("state", ReviewMoves.InWords(review.State)), ("revision sha256", digests.RevisionSha256), ("setup sha256", digests.SetupSha256),
                ("criteria sha256", digests.CriteriaSha256), ("run digest", digests.RunDigest), ("controller file sha256", digests.ControllerFileSha256),
                ("samples sha256", decided.Value.SamplesSha256), ("signed by", proof.Method), ("meaning", decided.Value.Meaning), ("reason", noted.Value)));
            return review.State;
        }, cancellation);
    }

    // Null for those who may not decide: nothing is computed for them, and the decision itself tells them why.
    private static async Task<Guid?> RunOfAsync(PortalSession session, Guid reviewId, CancellationToken cancellation)
    {
        var access = await session.AccessAsync(cancellation);
        var review = await session.Db.Reviews.SingleOrDefaultAsync(r => r.Id == reviewId, cancellation);
        if (review is null || access.Refuse(review.PlantId, Right.Read, What) is not null)
            return null;
        var plant = await session.Db.Plants.SingleAsync(p => p.Id == review.PlantId, cancellation);
        return plant.MayApprove(access)
            ? (await EvidenceReader.ReadAsync(session.Db, review.RevisionId, review.AssignmentId, cancellation)).RunId
            : null;
    }

    private static Refusal? RefuseEvidence(CurrentEvidence evidence, ReviewDecision decision, Review review)
    {
        if (evidence.Digests is { } now && now.ChangedSince(decision.Shown) is { } changed)
            return new(RefusalKind.Stale, $"Since you opened the page, {changed} changed. Look at the review again before you decide.");
        if (decision.Kind == DecisionKind.Reject)
            return null;
        if (evidence.NotUsable is { } unusable)
            return new(RefusalKind.WrongState, unusable);
        // NotAssessable fails here too: what could not be judged can't be approved.
        if (evidence.Verdict != Verdict.Pass)
            return new(RefusalKind.WrongState, "The run does not pass every binding criterion, so the revision can't be approved on this cell.");
        return review.Decisions.Where(d => d.Round == review.Round && d.Kind == DecisionKind.Approve)
            .Select(d => evidence.Digests!.ChangedSince(d.Evidence)).FirstOrDefault(c => c is not null) is { } differs
            ? new(RefusalKind.Stale, $"An earlier approval of this round rests on other evidence: {differs} changed. The revision has to be submitted again.")
            : null;
    }

    private static async Task LockEvidenceAsync(PortalDbContext data, Review review, CancellationToken cancellation)
    {
        await data.Database.ExecuteSqlAsync(
            $"""
            SELECT 1 FROM assignments a JOIN cells c ON c.id = a.cell_id JOIN programs p ON p.id = a.program_id
                JOIN criteria_sheets s ON s.id = p.criteria_sheet_id
            WHERE a.id = {review.AssignmentId} FOR SHARE OF a, c, p, s
            """, cancellation);
        await data.Database.ExecuteSqlAsync($"SELECT 1 FROM reviews WHERE id = {review.Id} FOR UPDATE", cancellation);
    }
}
