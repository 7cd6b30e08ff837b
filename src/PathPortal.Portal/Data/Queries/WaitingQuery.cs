using Microsoft.EntityFrameworkCore;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.Reviews;

namespace PathPortal.Portal.Data.Queries;

/// <summary>What needs the acting account today.</summary>
public sealed class WaitingQuery(PortalDb db)
{
    private const int AtMost = 50;

    public Task<Outcome<WaitingLists>> ReadAsync(Actor actor, CancellationToken cancellation = default) =>
        db.ReadAsync(actor, session => ReadAsync(session, cancellation), cancellation);

    private static async Task<Outcome<WaitingLists>> ReadAsync(PortalSession session, CancellationToken cancellation)
    {
        var visible = await VisiblePlants.OfAsync(session, cancellation);
        if (!visible.Succeeded)
            return visible.Refusal;
        var access = await session.AccessAsync(cancellation);
        var me = access.AccountId;
        var db = session.Db;
        var plants = await db.Plants.Where(p => visible.Value.Contains(p.Id)).ToListAsync(cancellation);
        var mayApprove = plants.Where(p => p.MayApprove(access)).Select(p => p.Id).ToList();

        var toDecide = await Rows(db, db.Reviews.Where(r =>
                r.State == ReviewState.InReview && mayApprove.Contains(r.PlantId) && r.SubmittedBy != me
                && !db.Revisions.Any(v => v.Id == r.RevisionId && v.UploadedBy == me)
                && !db.Decisions.Any(d => d.ReviewId == r.Id && d.Round == r.Round && d.DecidedBy == me)))
            .Take(AtMost).ToListAsync(cancellation);
        var sentBack = await Rows(db, db.Reviews.Where(r => r.State == ReviewState.Rejected && r.SubmittedBy == me
                && db.Revisions.Any(v => v.Id == r.RevisionId && db.Programs.Any(p => p.Id == v.ProgramId && p.LatestNumber == v.Number))))
            .Take(AtMost).ToListAsync(cancellation);
        var inReview = await Rows(db, db.Reviews.Where(r => r.State == ReviewState.InReview && r.SubmittedBy == me))
            .Take(AtMost).ToListAsync(cancellation);
        return new WaitingLists(toDecide, sentBack, inReview);
    }

    private static IQueryable<Waiting> Rows(PortalDbContext db, IQueryable<Review> reviews) =>
        from review in reviews
        join revision in db.Revisions on review.RevisionId equals revision.Id
        join program in db.Programs on revision.ProgramId equals program.Id
        join assignment in db.Assignments on review.AssignmentId equals assignment.Id
        join cell in db.Cells on assignment.CellId equals cell.Id
        join plant in db.Plants on cell.PlantId equals plant.Id
        let last = db.ReviewTransitions.Where(t => t.ReviewId == review.Id).OrderByDescending(t => t.Number).FirstOrDefault()
        orderby last.At
        select new Waiting(
            review.Id, review.State, program.Name, revision.Number, cell.Name, plant.Name, plant.TimeZone,
            db.Users.Where(u => u.Id == last.By).Select(u => u.DisplayName).FirstOrDefault(), last.At);
}
