using Microsoft.EntityFrameworkCore;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.People;
using PathPortal.Portal.Domain.Runs;

namespace PathPortal.Portal.Data.Queries;

/// <summary>Everything the page of one run shows, except its samples.</summary>
public sealed class RunQuery(PortalDb db)
{
    /// <param name="requestId">Which of the requests that share the run; null is the newest the account may see.</param>
    public Task<Outcome<RunDetails>> ReadAsync(Actor actor, Guid runId, Guid? requestId, CancellationToken cancellation = default) =>
        db.ReadAsync(actor, session => ReadAsync(session, runId, requestId, cancellation), cancellation);

    /// <summary>State and progress alone, for a page that waits.</summary>
    public Task<Outcome<RunProgressLine>> ReadProgressAsync(Actor actor, Guid runId, CancellationToken cancellation = default) =>
        db.ReadAsync(actor, session => ReadProgressAsync(session, runId, cancellation), cancellation);

    /// <summary>The stored bins alone, packed.</summary>
    public Task<Outcome<byte[]>> ReadBinsAsync(Actor actor, Guid runId, CancellationToken cancellation = default) =>
        db.ReadAsync(actor, session => ReadBinsAsync(session, runId, cancellation), cancellation);

    private static async Task<Outcome<RunDetails>> ReadAsync(PortalSession session, Guid runId, Guid? requestId, CancellationToken cancellation)
    {
        var db = session.Db;
        var access = await session.AccessAsync(cancellation);
        var found = await (
            from request in db.RunRequests
            where request.RunId == runId && (requestId == null || request.Id == requestId)
            orderby request.RequestedAt descending, request.Id descending
            join run in db.Runs on request.RunId equals run.Id
            join revision in db.Revisions on request.RevisionId equals revision.Id
            join program in db.Programs on revision.ProgramId equals program.Id
            join assignment in db.Assignments on request.AssignmentId equals assignment.Id
            join setup in db.CellSetups on request.CellSetupId equals setup.Id
            join cell in db.Cells on setup.CellId equals cell.Id
            join plant in db.Plants on run.PlantId equals plant.Id
            join armVersion in db.ArmModelVersions on setup.ArmModelVersionId equals armVersion.Id
            join arm in db.ArmModels on armVersion.ArmModelId equals arm.Id
            join criteriaVersion in db.CriteriaSheetVersions on request.CriteriaSheetVersionId equals criteriaVersion.Id
            join criteria in db.CriteriaSheets on criteriaVersion.CriteriaSheetId equals criteria.Id
            let newest = db.RunRequests.Where(r => r.RevisionId == request.RevisionId && r.AssignmentId == request.AssignmentId)
                .OrderByDescending(r => r.RequestedAt).ThenByDescending(r => r.Id).Select(r => r.RunId).FirstOrDefault()
            select new RunDetails(
                run,
                new(plant.Id, plant.Name, plant.TimeZone),
                new(program.Id, program.Name),
                new(revision.Id, revision.Number, revision.Sha256),
                revision.FileName,
                new(cell.Id, cell.Name),
                new(setup.Id, setup.Number, setup.Sha256),
                new(arm.Id, arm.Name),
                new(armVersion.Id, armVersion.Number, armVersion.Sha256),
                new(criteria.Id, criteria.Name),
                new(criteriaVersion.Id, criteriaVersion.Number, criteriaVersion.Sha256),
                assignment.ToolName,
                assignment.WorkFrameName,
                armVersion.Json,
                criteriaVersion.Json,
                db.Reviews.Where(r => r.RevisionId == request.RevisionId && r.AssignmentId == request.AssignmentId).Select(r => (Guid?)r.Id).FirstOrDefault(),
                newest == runId ? null : newest,
                db.Workers.Max(w => (DateTimeOffset?)w.LastSeenAt))).FirstOrDefaultAsync(cancellation);
        if (found is null)
            return access.Enabled ? Refusal.NotFound("run") : access.Refuse(Guid.Empty, Right.Read, "run")!;
        return access.Refuse(found.At.PlantId, Right.Read, "run") is { } refusal ? refusal : found;
    }

    private static async Task<Outcome<RunProgressLine>> ReadProgressAsync(PortalSession session, Guid runId, CancellationToken cancellation)
    {
        var access = await session.AccessAsync(cancellation);
        var found = await session.Db.Runs.Where(r => r.Id == runId)
            .Select(r => new { r.PlantId, Line = new RunProgressLine(r.Id, r.State, r.Progress, r.Attempts, r.Error) }).FirstOrDefaultAsync(cancellation);
        if (found is null)
            return Refusal.NotFound("run");
        return access.Refuse(found.PlantId, Right.Read, "run") is { } refusal ? refusal : found.Line;
    }

    private static async Task<Outcome<byte[]>> ReadBinsAsync(PortalSession session, Guid runId, CancellationToken cancellation)
    {
        var access = await session.AccessAsync(cancellation);
        var found = await session.Db.Runs.Where(r => r.Id == runId).Select(r => new { r.PlantId, r.Bins }).FirstOrDefaultAsync(cancellation);
        if (found is null)
            return Refusal.NotFound("run");
        if (access.Refuse(found.PlantId, Right.Read, "run") is { } refusal)
            return refusal;
        return found.Bins is { } bins ? bins : Refusal.NotFound("run");
    }
}
