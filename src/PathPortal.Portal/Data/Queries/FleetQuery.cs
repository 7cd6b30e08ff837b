using Microsoft.EntityFrameworkCore;
using PathPortal.Portal.Domain;

namespace PathPortal.Portal.Data.Queries;

/// <summary>Everything the fleet page and the lists of programs show, in a handful of statements whatever the size of the fleet.</summary>
public sealed class FleetQuery(PortalDb db)
{
    public Task<Outcome<FleetOverview>> ReadAsync(Actor actor, CancellationToken cancellation = default) =>
        db.ReadAsync(actor, session => ReadAsync(session, cancellation), cancellation);

    private static async Task<Outcome<FleetOverview>> ReadAsync(PortalSession session, CancellationToken cancellation)
    {
        var visible = await VisiblePlants.OfAsync(session, cancellation);
        if (!visible.Succeeded)
            return visible.Refusal;
        var plants = visible.Value;
        var db = session.Db;

        var figures = await (
            from assignment in db.Assignments
            where assignment.RetiredAt == null
            join cell in db.Cells on assignment.CellId equals cell.Id
            where plants.Contains(cell.PlantId) && cell.RetiredAt == null
            join program in db.Programs on assignment.ProgramId equals program.Id
            where program.RetiredAt == null
            join revision in db.Revisions on new { ProgramId = program.Id, Number = program.LatestNumber } equals new { revision.ProgramId, revision.Number }
            let request = db.RunRequests.Where(r => r.RevisionId == revision.Id && r.AssignmentId == assignment.Id)
                .OrderByDescending(r => r.RequestedAt).ThenByDescending(r => r.Id).Select(r => new { r.RunId, r.Problem }).FirstOrDefault()
            from run in db.Runs.Where(r => r.Id == request.RunId).DefaultIfEmpty()
            from review in db.Reviews.Where(r => r.RevisionId == revision.Id && r.AssignmentId == assignment.Id).DefaultIfEmpty()
            select new FleetFigure(
                program.Id, cell.Id, assignment.Id, revision.Id, revision.Number, request.RunId, request.Problem, run.State,
                (double?)run.Progress ?? 0, run.Verdict, run.WorstUse, run.WorstCriterion, (Guid?)review.Id, review.State)).ToListAsync(cancellation);
        var byProgram = figures.ToLookup(f => f.ProgramId);

        var assigned = await db.Assignments.Where(a => a.RetiredAt == null && db.Cells.Any(c => c.Id == a.CellId && plants.Contains(c.PlantId)))
            .Select(a => a.ProgramId).Distinct().ToListAsync(cancellation);
        var programs = await db.Programs.Where(p => p.RetiredAt == null && (plants.Contains(p.PlantId) || assigned.Contains(p.Id)))
            .OrderBy(p => p.Name).ThenBy(p => p.Id)
            .Select(p => new { p.Id, p.Name, p.Process, p.PlantId, p.PartId, p.LatestNumber }).ToListAsync(cancellation);
        var parts = programs.Select(p => p.PartId).Distinct().ToList();

        return new FleetOverview(
            await db.Plants.Where(p => plants.Contains(p.Id)).OrderBy(p => p.Name)
                .Select(p => new FleetOverview.Plant(p.Id, p.Name, p.TimeZone)).ToListAsync(cancellation),
            await db.Parts.Where(p => parts.Contains(p.Id)).OrderBy(p => p.Name).Select(p => new FleetOverview.Part(p.Id, p.Name)).ToListAsync(cancellation),
            [.. programs.Select(p => p.Process).Distinct().Order(StringComparer.OrdinalIgnoreCase)],
            await db.Cells.Where(c => c.RetiredAt == null && plants.Contains(c.PlantId)).OrderBy(c => c.Name)
                .Select(c => new FleetOverview.Cell(c.Id, c.Name, c.PlantId)).ToListAsync(cancellation),
            [.. programs.Select(p => new FleetOverview.Program(
                p.Id, p.Name, p.Process, p.PlantId, p.PartId, p.LatestNumber, byProgram[p.Id].ToDictionary(f => f.CellId)))],
            await db.Workers.MaxAsync(w => (DateTimeOffset?)w.LastSeenAt, cancellation));
    }
}
