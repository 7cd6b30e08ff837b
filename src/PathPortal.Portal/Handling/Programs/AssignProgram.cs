using Microsoft.EntityFrameworkCore;
using PathPortal.Formats.Documents;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.History;
using PathPortal.Portal.Domain.People;
using PathPortal.Portal.Domain.Programs;
using PathPortal.Portal.Domain.Reviews;
using PathPortal.Portal.Handling.Runs;
using PathPortal.Portal.Jobs;
using PathPortal.Portal.Simulation;

namespace PathPortal.Portal.Handling.Programs;

/// <summary>Puts a program on a cell, or changes how it runs there: the old assignment is retired and the newest revision simulated on the new one.</summary>
public sealed class AssignProgram(PortalDb db, RunRequester requester)
{
    /// <returns>The assignment's id.</returns>
    public async Task<Outcome<Guid>> HandleAsync(Actor actor, Guid programId, Guid cellId, StartTerms terms, CancellationToken cancellation = default)
    {
        ArgumentNullException.ThrowIfNull(terms);
        return await db.ActAsync<Guid>(actor, async session =>
        {
            var data = session.Db;
            var access = await session.AccessAsync(cancellation);
            var cell = await data.Cells.SingleOrDefaultAsync(c => c.Id == cellId, cancellation);
            var program = await data.Programs.SingleOrDefaultAsync(p => p.Id == programId, cancellation);
            if (cell is null)
                return Refusal.NotFound("cell");
            if (access.Refuse(cell.PlantId, Right.EditPrograms, "cell") is { } refusal)
                return refusal;
            if (program is null || !await MaySeeAsync(data, access, program, cancellation))
                return Refusal.NotFound("program");
            if (cell.RetiredAt is not null || program.RetiredAt is not null)
                return new Refusal(RefusalKind.WrongState, $"The {(cell.RetiredAt is null ? "program" : "cell")} is retired.");
            if (await RefuseTermsAsync(data, cellId, cell.LatestSetupNumber, terms, cancellation) is { } wrong)
                return wrong;

            var old = await data.Assignments.SingleOrDefaultAsync(a => a.ProgramId == programId && a.CellId == cellId && a.RetiredAt == null, cancellation);
            if (old is not null)
            {
                if (await RefuseReplacingAsync(data, old, terms, cancellation) is { } standing)
                    return standing;
                old.Retire(session.Now);
                // Written first, or the one assignment in force would meet its successor.
                await data.SaveChangesAsync(cancellation);
            }
            var assignment = new Assignment(programId, cellId, terms, access.AccountId, session.Now);
            data.Assignments.Add(assignment);
            await data.SaveChangesAsync(cancellation);
            if (await data.Revisions.SingleOrDefaultAsync(r => r.ProgramId == programId && r.Number == program.LatestNumber, cancellation) is { } revision
                && ScenarioBuilder.ReadPath(revision.Format, revision.Source).Path is { } path)
                await requester.RequestAsync(session, revision, path, [assignment.Id], access.AccountId, RunPriority.Interactive, cancellation);
            session.Tell(HistoryDraft.Of(cell.PlantId, "assignment", assignment.Id, old is null ? "made" : "changed",
                ("program", program.Name), ("cell", cell.Name), ("tool", terms.ToolName), ("work frame", terms.WorkFrameName)));
            return assignment.Id;
        }, cancellation);
    }

    private static async Task<bool> MaySeeAsync(PortalDbContext data, Access access, PathProgram program, CancellationToken cancellation) =>
        access.May(program.PlantId, Right.Read)
        || await data.Assignments.AnyAsync(
            a => a.ProgramId == program.Id && a.RetiredAt == null && data.Cells.Any(c => c.Id == a.CellId && access.Plants.Contains(c.PlantId)), cancellation);

    private static async Task<Refusal?> RefuseTermsAsync(PortalDbContext data, Guid cellId, int number, StartTerms terms, CancellationToken cancellation)
    {
        var stored = await (
            from setup in data.CellSetups
            where setup.CellId == cellId && setup.Number == number
            join arm in data.ArmModelVersions on setup.ArmModelVersionId equals arm.Id
            select new { Setup = setup.Json, Arm = arm.Json }).SingleOrDefaultAsync(cancellation);
        if (stored is null)
            return new(RefusalKind.WrongState, "The cell has no setup yet; describe it first.");
        var (read, model) = (CellSetupDocument.Read(stored.Setup), ArmDocument.Read(stored.Arm));
        if (!read.Ok || !model.Ok)
            return new(RefusalKind.WrongState, "The cell's setup can't be read; save it again first.");
        if (!read.Value.Tools.Exists(t => t.Name == terms.ToolName))
            return new(RefusalKind.Invalid, "Choose one of the cell's tools.");
        if (!read.Value.Frames.Exists(f => f.Name == terms.WorkFrameName))
            return new(RefusalKind.Invalid, "Choose one of the cell's work frames.");
        if (terms.StartJoints is { } joints && (joints.Length != model.Value.Joints.Count || !joints.All(double.IsFinite)))
            return new(RefusalKind.Invalid, $"The start posture needs a number for each of the arm's {model.Value.Joints.Count} joints.");
        return terms.FreeTurn is { } turn && !(Math.Abs(turn) <= 2 * Math.PI)
            ? new(RefusalKind.Invalid, "The turn about the free tool axis is at most one full turn either way.")
            : null;
    }

    private static async Task<Refusal?> RefuseReplacingAsync(PortalDbContext data, Assignment old, StartTerms terms, CancellationToken cancellation)
    {
        var same = old.ToolName == terms.ToolName && old.WorkFrameName == terms.WorkFrameName && Nullable.Equals(old.FreeTurn, terms.FreeTurn)
            && (old.StartJoints ?? []).SequenceEqual(terms.StartJoints ?? []) && old.StartJoints is null == terms.StartJoints is null;
        if (same)
            return new(RefusalKind.Invalid, "The program runs on the cell in this way already.");
        var standing = await data.Reviews
            .Where(r => r.AssignmentId == old.Id && (r.State == ReviewState.InReview || r.State == ReviewState.Approved
                || r.State == ReviewState.Proved || r.State == ReviewState.Released))
            .Select(r => (ReviewState?)r.State).FirstOrDefaultAsync(cancellation);
        return standing is { } state
            ? new(RefusalKind.WrongState, $"A revision is {ReviewMoves.InWords(state)} on this cell as it is assigned now; withdraw it first.")
            : null;
    }
}
