using Microsoft.EntityFrameworkCore;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.People;

namespace PathPortal.Portal.Data.Queries;

/// <summary>Everything the page of one program shows.</summary>
public sealed class ProgramQuery(PortalDb db)
{
    public Task<Outcome<ProgramDetails>> ReadAsync(Actor actor, Guid programId, CancellationToken cancellation = default) =>
        db.ReadAsync(actor, session => ReadAsync(session, programId, cancellation), cancellation);

    private static async Task<Outcome<ProgramDetails>> ReadAsync(PortalSession session, Guid programId, CancellationToken cancellation)
    {
        var visible = await VisiblePlants.OfAsync(session, cancellation);
        if (!visible.Succeeded)
            return visible.Refusal;
        var plants = visible.Value;
        var db = session.Db;
        var access = await session.AccessAsync(cancellation);

        var program = await (
            from p in db.Programs
            where p.Id == programId && (plants.Contains(p.PlantId)
                || db.Assignments.Any(a => a.ProgramId == p.Id && a.RetiredAt == null && db.Cells.Any(c => c.Id == a.CellId && plants.Contains(c.PlantId))))
            join plant in db.Plants on p.PlantId equals plant.Id
            join part in db.Parts on p.PartId equals part.Id
            join sheet in db.CriteriaSheets on p.CriteriaSheetId equals sheet.Id
            select new { p.Id, p.Name, p.Process, p.PlantId, PlantName = plant.Name, plant.TimeZone, Part = part.Name, p.CriteriaSheetId, Sheet = sheet.Name })
            .SingleOrDefaultAsync(cancellation);
        if (program is null)
            return Refusal.NotFound("program");

        var revisions = await db.Revisions.Where(r => r.ProgramId == programId).OrderByDescending(r => r.Number)
            .Select(r => new ProgramDetails.RevisionLine(
                r.Id, r.Number, r.FileName, r.Format, r.Sha256, r.SourceSize, r.PointCount, r.Length, r.PlannedTime, r.BoxLow, r.BoxHigh, r.Remarks, r.Note,
                db.Users.Where(u => u.Id == r.UploadedBy).Select(u => u.DisplayName).First(), r.UploadedAt)).ToListAsync(cancellation);
        var assignments = await (
            from a in db.Assignments
            where a.ProgramId == programId
            join cell in db.Cells on a.CellId equals cell.Id
            where plants.Contains(cell.PlantId)
            join plant in db.Plants on cell.PlantId equals plant.Id
            orderby plant.Name, cell.Name, a.CreatedAt
            select new { Assignment = a, cell.Name, cell.PlantId, Plant = plant.Name }).ToListAsync(cancellation);
        var files = await (
            from f in db.ControllerFiles
            where db.Revisions.Any(r => r.Id == f.RevisionId && r.ProgramId == programId) && db.Cells.Any(c => c.Id == f.CellId && plants.Contains(c.PlantId))
                && !db.ControllerFiles.Any(newer => newer.RevisionId == f.RevisionId && newer.CellId == f.CellId
                    && (newer.AttachedAt > f.AttachedAt || (newer.AttachedAt == f.AttachedAt && newer.Id.CompareTo(f.Id) > 0)))
            select new ProgramDetails.File(
                f.Id, f.RevisionId, f.CellId, f.FileName, f.Size, f.Sha256,
                db.Users.Where(u => u.Id == f.AttachedBy).Select(u => u.DisplayName).First(), f.AttachedAt)).ToListAsync(cancellation);

        return new ProgramDetails(
            program.Id, program.Name, program.Process, program.PlantId, program.PlantName, program.TimeZone, program.Part, program.CriteriaSheetId, program.Sheet,
            revisions,
            [.. assignments.Select(a => new ProgramDetails.AssignmentLine(
                a.Assignment.Id, a.Assignment.CellId, a.Name, a.PlantId, a.Plant, a.Assignment.ToolName, a.Assignment.WorkFrameName,
                a.Assignment.StartJoints is not null, a.Assignment.FreeTurn, a.Assignment.RetiredAt,
                access.May(a.PlantId, Right.AttachControllerFile), access.May(a.PlantId, Right.SubmitReview)))],
            await FiguresAsync(db, programId, plants, cancellation), files,
            access.May(program.PlantId, Right.UploadRevision), access.May(program.PlantId, Right.EditPrograms),
            await db.Workers.MaxAsync(w => (DateTimeOffset?)w.LastSeenAt, cancellation));
    }

    private static Task<List<ProgramDetails.Figure>> FiguresAsync(PortalDbContext db, Guid programId, List<Guid> plants, CancellationToken cancellation) => (
        from revision in db.Revisions
        where revision.ProgramId == programId
        from assignment in db.Assignments.Where(a => a.ProgramId == programId && db.Cells.Any(c => c.Id == a.CellId && plants.Contains(c.PlantId)))
        let request = db.RunRequests.Where(r => r.RevisionId == revision.Id && r.AssignmentId == assignment.Id)
            .OrderByDescending(r => r.RequestedAt).ThenByDescending(r => r.Id).Select(r => new { r.Id, r.RunId, r.Problem }).FirstOrDefault()
        where request != null
        from run in db.Runs.Where(r => r.Id == request.RunId).DefaultIfEmpty()
        from review in db.Reviews.Where(r => r.RevisionId == revision.Id && r.AssignmentId == assignment.Id).DefaultIfEmpty()
        select new ProgramDetails.Figure(
            revision.Id, assignment.Id, request.Id, request.RunId, request.Problem, run.State, (double?)run.Progress ?? 0, run.Verdict, run.WorstUse,
            run.WorstCriterion, run.CycleTime, (Guid?)review.Id, review.State)).ToListAsync(cancellation);
}
