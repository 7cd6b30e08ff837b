using Microsoft.EntityFrameworkCore;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.Fleet;
using PathPortal.Portal.Domain.People;
using PathPortal.Portal.Domain.Reviews;
using PathPortal.Portal.Handling.Reviews;

namespace PathPortal.Portal.Data.Queries;

/// <summary>Everything the page of one review shows.</summary>
public sealed class ReviewQuery(PortalDb db)
{
    public Task<Outcome<ReviewDetails>> ReadAsync(Actor actor, Guid reviewId, CancellationToken cancellation = default) =>
        db.ReadAsync(actor, session => ReadAsync(session, reviewId, cancellation), cancellation);

    private static async Task<Outcome<ReviewDetails>> ReadAsync(PortalSession session, Guid reviewId, CancellationToken cancellation)
    {
        var data = session.Db;
        var access = await session.AccessAsync(cancellation);
        var review = await data.Reviews.SingleOrDefaultAsync(r => r.Id == reviewId, cancellation);
        if (review is null)
            return access.Enabled ? Refusal.NotFound("review") : access.Refuse(Guid.Empty, Right.Read, "review")!;
        if (access.Refuse(review.PlantId, Right.Read, "review") is { } refusal)
            return refusal;

        var evidence = await EvidenceReader.ReadAsync(data, review.RevisionId, review.AssignmentId, cancellation);
        var plant = await data.Plants.SingleAsync(p => p.Id == review.PlantId, cancellation);
        var about = await SubjectAsync(data, review, plant, evidence.RunRequestId, cancellation);
        var steps = await data.ReviewTransitions.Where(t => t.ReviewId == reviewId).OrderBy(t => t.Number)
            .Select(t => new ReviewDetails.Move(
                t.Number, t.From, t.To, data.Users.Where(u => u.Id == t.By).Select(u => u.DisplayName).FirstOrDefault(), t.Why, t.At))
            .ToListAsync(cancellation);
        var decisions = await data.Decisions.Where(d => d.ReviewId == reviewId).OrderBy(d => d.DecidedAt)
            .Select(d => new
            {
                d.Kind,
                d.Round,
                d.DecidedBy,
                d.DecidedAt,
                d.Meaning,
                d.Reason,
                d.RevisionSha256,
                d.SetupSha256,
                d.CriteriaSha256,
                d.RunDigest,
                d.ControllerFileSha256,
                By = data.Users.Where(u => u.Id == d.DecidedBy).Select(u => u.DisplayName).First(),
            }).ToListAsync(cancellation);
        var uploadedBy = await data.Revisions.Where(r => r.Id == review.RevisionId).Select(r => r.UploadedBy).SingleAsync(cancellation);
        var decidedAlready = decisions.Exists(d => d.Round == review.Round && d.DecidedBy == access.AccountId);

        return new ReviewDetails(
            review.Id, review.State, review.Round, review.ApprovalsRequired, review.ApprovalsGiven, about, evidence,
            evidence.RunId is { } run ? await data.Runs.Where(r => r.Id == run).Select(r => r.SummaryJson).SingleAsync(cancellation) : null,
            await data.ControllerFiles.Where(f => f.RevisionId == review.RevisionId && f.CellId == about.CellId)
                .OrderByDescending(f => f.AttachedAt).ThenByDescending(f => f.Id)
                .Select(f => new ReviewDetails.ControllerFile(f.Id, f.FileName, f.Sha256, f.AttachedAt)).FirstOrDefaultAsync(cancellation),
            steps,
            [.. decisions.Select(d => new ReviewDetails.Signature(
                d.Kind, d.Round, d.By, d.DecidedAt, d.Meaning, d.Reason,
                new(d.RevisionSha256, d.SetupSha256, d.CriteriaSha256, d.RunDigest, d.ControllerFileSha256)))],
            WhyNotDecide(review, plant, access, uploadedBy, decidedAlready),
            access.May(review.PlantId, Right.SubmitReview) && ReviewMoves.MayFollow(review.State, ReviewState.InReview),
            (plant.MayApprove(access) || access.May(review.PlantId, Right.SubmitReview)) && ReviewMoves.MayFollow(review.State, ReviewState.Withdrawn));
    }

    private static async Task<ReviewDetails.Subject> SubjectAsync(
        PortalDbContext data, Review review, Plant plant, Guid? requestId, CancellationToken cancellation) => await (
        from assignment in data.Assignments
        where assignment.Id == review.AssignmentId
        join cell in data.Cells on assignment.CellId equals cell.Id
        from revision in data.Revisions.Where(r => r.Id == review.RevisionId)
        join program in data.Programs on revision.ProgramId equals program.Id
        join part in data.Parts on program.PartId equals part.Id
        from request in data.RunRequests.Where(r => r.Id == requestId).DefaultIfEmpty()
        from setup in data.CellSetups.Where(s => s.Id == request.CellSetupId).DefaultIfEmpty()
        from armVersion in data.ArmModelVersions.Where(v => v.Id == setup.ArmModelVersionId).DefaultIfEmpty()
        from arm in data.ArmModels.Where(a => a.Id == armVersion.ArmModelId).DefaultIfEmpty()
        from criteria in data.CriteriaSheetVersions.Where(v => v.Id == request.CriteriaSheetVersionId).DefaultIfEmpty()
        from sheet in data.CriteriaSheets.Where(s => s.Id == criteria.CriteriaSheetId).DefaultIfEmpty()
        select new ReviewDetails.Subject(
            program.Id, program.Name, program.Process, part.Name, revision.Id, revision.Number, revision.Note,
            data.Users.Where(u => u.Id == revision.UploadedBy).Select(u => u.DisplayName).First(), revision.UploadedAt, assignment.Id, cell.Id, cell.Name,
            plant.Id, plant.Name, plant.TimeZone, assignment.ToolName, assignment.WorkFrameName, (int?)setup.Number, arm.Name, (int?)armVersion.Number,
            (Guid?)sheet.Id, sheet.Name, (int?)criteria.Number)).SingleAsync(cancellation);

    // Said before the form is filled in; the handler and the database decide.
    private static string? WhyNotDecide(Review review, Plant plant, Access access, Guid uploadedBy, bool decidedAlready) => review.State switch
    {
        not ReviewState.InReview => $"The review is {ReviewMoves.InWords(review.State)}.",
        _ when !plant.MayApprove(access) => $"In {plant.Name} {string.Join(" or ", plant.ApprovingRoles)} decides.",
        _ when uploadedBy == access.AccountId => "You uploaded this revision; somebody else has to decide on it.",
        _ when review.SubmittedBy == access.AccountId => "You submitted this revision; somebody else has to decide on it.",
        _ when decidedAlready => "You have decided in this round; the next decision is another person's.",
        _ => null,
    };
}
