using Microsoft.EntityFrameworkCore;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain.Reviews;

namespace PathPortal.Portal.Handling.Reviews;

/// <summary>Finds what a revision on an assignment rests on now: newest request, its run, and whether setup or criteria moved on since.</summary>
public static class EvidenceReader
{
    public static async Task<CurrentEvidence> ReadAsync(PortalDbContext db, Guid revisionId, Guid assignmentId, CancellationToken cancellation = default)
    {
        var found = await (
            from request in db.RunRequests
            where request.RevisionId == revisionId && request.AssignmentId == assignmentId
            orderby request.RequestedAt descending, request.Id descending
            join revision in db.Revisions on request.RevisionId equals revision.Id
            join program in db.Programs on revision.ProgramId equals program.Id
            join sheet in db.CriteriaSheets on program.CriteriaSheetId equals sheet.Id
            join criteria in db.CriteriaSheetVersions on request.CriteriaSheetVersionId equals criteria.Id
            join assignment in db.Assignments on request.AssignmentId equals assignment.Id
            join cell in db.Cells on assignment.CellId equals cell.Id
            join setup in db.CellSetups on request.CellSetupId equals setup.Id
            from run in db.Runs.Where(r => r.Id == request.RunId).DefaultIfEmpty()
            select new
            {
                request.Id,
                request.RunId,
                request.Problem,
                State = (Domain.Runs.RunState?)run.State,
                run.Verdict,
                run.Digest,
                RevisionSha256 = revision.Sha256,
                SetupSha256 = setup.Sha256,
                CriteriaSha256 = criteria.Sha256,
                SetupMoved = setup.Number != cell.LatestSetupNumber,
                CriteriaMoved = criteria.CriteriaSheetId != sheet.Id || criteria.Number != sheet.LatestNumber,
                File = db.ControllerFiles.Where(f => f.RevisionId == revisionId && f.CellId == cell.Id)
                    .OrderByDescending(f => f.AttachedAt).ThenByDescending(f => f.Id).Select(f => f.Sha256).FirstOrDefault(),
            }).FirstOrDefaultAsync(cancellation);
        if (found is null)
            return new(null, null, null, null, null, null, null);
        var moved = (found.SetupMoved, found.CriteriaMoved) switch
        {
            (true, true) => "the cell's setup and the criteria",
            (true, false) => "the cell's setup",
            (false, true) => "the criteria",
            _ => null,
        };
        var digests = found.RunId is null
            ? null
            : new Evidence(found.RevisionSha256, found.SetupSha256, found.CriteriaSha256, found.Digest, found.File);
        return new(found.Id, found.RunId, found.State, found.Verdict, digests, moved, found.Problem);
    }
}
