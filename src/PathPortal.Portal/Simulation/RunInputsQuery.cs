using Microsoft.EntityFrameworkCore;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain.Programs;

namespace PathPortal.Portal.Simulation;

/// <summary>Reads what a run is to be computed from.</summary>
public static class RunInputsQuery
{
    /// <summary>Null when there is no such run, or nobody asked for it.</summary>
    public static async Task<RunInputs?> ReadAsync(PortalSession session, Guid runId, CancellationToken cancellation = default)
    {
        var db = session.Db;
        // Requests that share a run share its digest, so any of them will do; the first never changes.
        var found = await (
            from request in db.RunRequests
            where request.RunId == runId
            orderby request.RequestedAt, request.Id
            join run in db.Runs on request.RunId equals run.Id
            join revision in db.Revisions on request.RevisionId equals revision.Id
            join setup in db.CellSetups on request.CellSetupId equals setup.Id
            join arm in db.ArmModelVersions on setup.ArmModelVersionId equals arm.Id
            join criteria in db.CriteriaSheetVersions on request.CriteriaSheetVersionId equals criteria.Id
            join assignment in db.Assignments on request.AssignmentId equals assignment.Id
            select new
            {
                run.Digest,
                run.NumericsVersion,
                revision.Format,
                revision.Source,
                ArmJson = arm.Json,
                SetupJson = setup.Json,
                CriteriaJson = criteria.Json,
                assignment.ToolName,
                assignment.WorkFrameName,
                assignment.StartJoints,
                assignment.FreeTurn,
            }).FirstOrDefaultAsync(cancellation);
        return found is null ? null : new(
            runId,
            found.Digest,
            found.NumericsVersion,
            found.Format,
            found.Source,
            new(
                found.ArmJson,
                found.SetupJson,
                found.CriteriaJson,
                new StartTerms(found.ToolName, found.WorkFrameName, found.StartJoints, found.FreeTurn)));
    }
}
