using Microsoft.EntityFrameworkCore;
using PathPortal.Engine;
using PathPortal.Engine.Paths;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain.Programs;
using PathPortal.Portal.Domain.Runs;
using PathPortal.Portal.Jobs;
using PathPortal.Portal.Simulation;

namespace PathPortal.Portal.Handling.Runs;

/// <summary>
/// Asks for the runs of a revision with the setups and criteria of this moment, in the caller's transaction. Inputs that were simulated
/// before share the run that is there; inputs that don't fit together leave a request that says why.
/// </summary>
public sealed class RunRequester(RunQueue queue)
{
    /// <param name="path">The revision's path, read already.</param>
    /// <param name="assignmentIds">Assignments of the revision's program.</param>
    /// <param name="by">Null when no person asked.</param>
    public async Task<IReadOnlyList<RunRequest>> RequestAsync(
        PortalSession session, Revision revision, ToolPath path, IReadOnlyCollection<Guid> assignmentIds, Guid? by, RunPriority priority,
        CancellationToken cancellation)
    {
        var targets = await ReadTargetsAsync(session.Db, assignmentIds, cancellation);
        List<RunRequest> requests = [];
        List<Run> fresh = [];
        foreach (var target in targets)
        {
            var built = ScenarioBuilder.Build(path, new(target.ArmJson, target.SetupJson, target.CriteriaJson, target.Terms));
            Run? run = null;
            if (built.Ok)
            {
                run = fresh.Find(r => r.PlantId == target.PlantId && r.Digest == built.Digest)
                    ?? await session.Db.Runs.SingleOrDefaultAsync(r => r.PlantId == target.PlantId && r.Digest == built.Digest, cancellation);
                if (run is null)
                {
                    run = new Run(target.PlantId, built.Digest, NumericsVersion.Current, session.Now);
                    session.Db.Runs.Add(run);
                    fresh.Add(run);
                }
                else if (run.State == RunState.Failed && run.Requeue(session.Now))
                {
                    fresh.Add(run);
                }
            }
            var request = new RunRequest(
                run, built.Ok ? null : built.ProblemText, revision.Id, target.AssignmentId, target.SetupId, target.CriteriaVersionId, by, session.Now);
            session.Db.RunRequests.Add(request);
            requests.Add(request);
        }
        queue.Enqueue(session, fresh, priority);
        return requests;
    }

    // A cell without a setup can't be assigned to, and a sheet without a version can't be chosen; so every assignment has both.
    private static Task<List<Target>> ReadTargetsAsync(PortalDbContext db, IReadOnlyCollection<Guid> assignmentIds, CancellationToken cancellation) => (
        from assignment in db.Assignments
        where assignmentIds.Contains(assignment.Id)
        join cell in db.Cells on assignment.CellId equals cell.Id
        join setup in db.CellSetups on new { CellId = cell.Id, Number = cell.LatestSetupNumber } equals new { setup.CellId, setup.Number }
        join arm in db.ArmModelVersions on setup.ArmModelVersionId equals arm.Id
        join program in db.Programs on assignment.ProgramId equals program.Id
        join sheet in db.CriteriaSheets on program.CriteriaSheetId equals sheet.Id
        join criteria in db.CriteriaSheetVersions
            on new { CriteriaSheetId = sheet.Id, Number = sheet.LatestNumber } equals new { criteria.CriteriaSheetId, criteria.Number }
        orderby assignment.Id
        select new Target(
            assignment.Id, cell.PlantId, setup.Id, setup.Json, arm.Json, criteria.Id, criteria.Json,
            new StartTerms(assignment.ToolName, assignment.WorkFrameName, assignment.StartJoints, assignment.FreeTurn))).ToListAsync(cancellation);

    private sealed record Target(
        Guid AssignmentId, Guid PlantId, Guid SetupId, string SetupJson, string ArmJson, Guid CriteriaVersionId, string CriteriaJson, StartTerms Terms);
}
