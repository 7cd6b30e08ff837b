using System.Globalization;
using Microsoft.EntityFrameworkCore;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.History;
using PathPortal.Portal.Domain.People;
using PathPortal.Portal.Domain.Programs;
using PathPortal.Portal.Domain.Reviews;

namespace PathPortal.Portal.Handling.Programs;

/// <summary>Keeps the cell controller's own program for a revision. It is part of the evidence, so an approval that rests on another one stands in the way.</summary>
public sealed class AttachControllerFile(PortalDb db)
{
    public async Task<Outcome<ControllerFile>> HandleAsync(
        Actor actor, Guid revisionId, Guid cellId, string fileName, byte[] bytes, CancellationToken cancellation = default)
    {
        ArgumentNullException.ThrowIfNull(bytes);
        var named = FileNames.Parse(fileName);
        if (!named.Succeeded)
            return named.Refusal;
        if (bytes.Length is 0 or > ControllerFile.MaxBytes)
        {
            return new Refusal(RefusalKind.Invalid, bytes.Length == 0
                ? "The file is empty."
                : $"The file has more than {(ControllerFile.MaxBytes / 1024 / 1024).ToString(CultureInfo.InvariantCulture)} MiB.");
        }

        return await db.ActAsync<ControllerFile>(actor, async session =>
        {
            var data = session.Db;
            var cell = await data.Cells.SingleOrDefaultAsync(c => c.Id == cellId, cancellation);
            if (cell is null)
                return Refusal.NotFound("cell");
            if ((await session.AccessAsync(cancellation)).Refuse(cell.PlantId, Right.AttachControllerFile, "cell") is { } refusal)
                return refusal;
            var revision = await (
                from r in data.Revisions
                where r.Id == revisionId && data.Assignments.Any(a => a.ProgramId == r.ProgramId && a.CellId == cellId)
                join p in data.Programs on r.ProgramId equals p.Id
                select new { r.Number, p.Name }).SingleOrDefaultAsync(cancellation);
            if (revision is null)
                return Refusal.NotFound("revision on this cell");
            // Locked: an approval given at this moment would rest on the file before.
            var reviews = await data.Reviews
                .FromSql($"SELECT *, xmin FROM reviews WHERE revision_id = {revisionId} ORDER BY id FOR UPDATE")
                .AsNoTracking().ToListAsync(cancellation);
            var onCell = await data.Assignments.Where(a => a.CellId == cellId).Select(a => a.Id).ToListAsync(cancellation);
            if (reviews.Find(r => onCell.Contains(r.AssignmentId) && RestsOnFile(r)) is { } review)
            {
                return new Refusal(RefusalKind.WrongState, review.State == ReviewState.InReview
                    ? "The revision was approved once already with the file that is there; withdraw it from review first."
                    : $"The revision is {ReviewMoves.InWords(review.State)} on this cell with the file that is there; withdraw it first.");
            }

            var file = new ControllerFile(revisionId, cellId, named.Value, bytes, actor.AccountId!.Value, session.Now);
            data.ControllerFiles.Add(file);
            session.Tell(HistoryDraft.Of(cell.PlantId, "controller file", file.Id, "attached",
                ("program", revision.Name), ("revision", revision.Number.ToString(CultureInfo.InvariantCulture)), ("cell", cell.Name),
                ("file", file.FileName), ("sha256", file.Sha256)));
            return file;
        }, cancellation);
    }

    private static bool RestsOnFile(Review review) => review.State switch
    {
        ReviewState.InReview => review.ApprovalsGiven > 0,
        ReviewState.Approved or ReviewState.Proved or ReviewState.Released => true,
        _ => false,
    };
}
