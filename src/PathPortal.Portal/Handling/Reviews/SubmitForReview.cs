using System.Globalization;
using Microsoft.EntityFrameworkCore;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.History;
using PathPortal.Portal.Domain.People;
using PathPortal.Portal.Domain.Reviews;

namespace PathPortal.Portal.Handling.Reviews;

/// <summary>
/// Asks for a revision to be approved on one cell. Older revisions that were still in review there are superseded: two answers to one
/// question would be one too many.
/// </summary>
public sealed class SubmitForReview(PortalDb db)
{
    private const string What = "revision on this cell";

    /// <returns>The review's id.</returns>
    public async Task<Outcome<Guid>> HandleAsync(Actor actor, Guid revisionId, Guid assignmentId, string why, CancellationToken cancellation = default)
    {
        var noted = Names.Note(why);
        if (!noted.Succeeded)
            return noted.Refusal;
        return await db.ActAsync<Guid>(actor, async session =>
        {
            var data = session.Db;
            var access = await session.AccessAsync(cancellation);
            var target = await (
                from assignment in data.Assignments
                where assignment.Id == assignmentId
                join revision in data.Revisions on assignment.ProgramId equals revision.ProgramId
                where revision.Id == revisionId
                join program in data.Programs on revision.ProgramId equals program.Id
                join cell in data.Cells on assignment.CellId equals cell.Id
                join plant in data.Plants on cell.PlantId equals plant.Id
                select new
                {
                    Plant = plant,
                    Cell = cell.Name,
                    Program = program.Name,
                    revision.Number,
                    Retired = assignment.RetiredAt != null || cell.RetiredAt != null || program.RetiredAt != null,
                }).SingleOrDefaultAsync(cancellation);
            if (target is null)
                return Refusal.NotFound(What);
            if (access.Refuse(target.Plant.Id, Right.SubmitReview, What) is { } refusal)
                return refusal;
            if (target.Retired)
                return new Refusal(RefusalKind.WrongState, "The program no longer runs on this cell in this way.");
            if ((await EvidenceReader.ReadAsync(data, revisionId, assignmentId, cancellation)).NotUsable is { } missing)
                return new Refusal(RefusalKind.WrongState, missing);

            var others = await data.Reviews
                .Where(r => r.AssignmentId == assignmentId && r.RevisionId != revisionId && r.State == ReviewState.InReview)
                .Select(r => new { Review = r, data.Revisions.Single(v => v.Id == r.RevisionId).Number }).ToListAsync(cancellation);
            if (others.Find(o => o.Number > target.Number) is { } newer)
                return new Refusal(RefusalKind.WrongState, $"Revision {Text(newer.Number)} is in review on this cell already.");

            var review = await data.Reviews.SingleOrDefaultAsync(r => r.RevisionId == revisionId && r.AssignmentId == assignmentId, cancellation);
            if (review is null)
            {
                review = new Review(target.Plant.Id, revisionId, assignmentId, session.Now);
                data.Reviews.Add(review);
            }
            var moved = review.Submit(access.AccountId, target.Plant.ApprovalsRequired, noted.Value, session.Now);
            if (!moved.Succeeded)
                return moved.Refusal;
            foreach (var other in others)
                other.Review.Supersede(access.AccountId, $"Revision {Text(target.Number)} was submitted.", session.Now);
            session.Tell(HistoryDraft.Of(target.Plant.Id, "review", review.Id, "submitted",
                ("program", target.Program), ("revision", Text(target.Number)), ("cell", target.Cell), ("round", Text(review.Round)),
                ("approvals required", Text(review.ApprovalsRequired)), ("why", noted.Value),
                ("superseded", others.Count == 0 ? null : string.Join(", ", others.Select(o => $"revision {Text(o.Number)}")))));
            return review.Id;
        }, cancellation);
    }

    private static string Text(int number) => number.ToString(CultureInfo.InvariantCulture);
}
