using System.Globalization;
using Microsoft.EntityFrameworkCore;
using PathPortal.Formats.Documents;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.Fleet;
using PathPortal.Portal.Domain.History;
using PathPortal.Portal.Domain.People;

namespace PathPortal.Portal.Handling.Fleet;

/// <summary>Saves a new version of a cell's setup. Tools and work frames that assigned programs use must still be there.</summary>
public sealed class SaveCellSetup(PortalDb db)
{
    private const string What = "cell";

    /// <param name="basedOn">Number of the setup the changes started from; 0 for the first.</param>
    /// <returns>Number of the new setup.</returns>
    public async Task<Outcome<CellSetup>> HandleAsync(
        Actor actor, Guid cellId, int basedOn, Guid armVersionId, CellSetupDocument document, string note, CancellationToken cancellation = default)
    {
        ArgumentNullException.ThrowIfNull(document);
        var noted = Names.Note(note);
        if ((noted.Refusal ?? DefinitionRefusals.OfProblems(document.Validate())) is { } wrong)
            return wrong;
        var stored = StoredDocument.Of(document.ToJson());

        return await db.ActAsync<CellSetup>(actor, async session =>
        {
            var data = session.Db;
            var cell = await data.Cells.SingleOrDefaultAsync(c => c.Id == cellId, cancellation);
            if (cell is null)
                return Refusal.NotFound(What);
            if ((await session.AccessAsync(cancellation)).Refuse(cell.PlantId, Right.EditCells, What) is { } refusal)
                return refusal;
            if (cell.RetiredAt is not null)
                return DefinitionRefusals.Retired(What);
            if (DefinitionRefusals.OfVersion(cell.LatestSetupNumber, basedOn, What) is { } stale)
                return stale;
            var arm = await (
                from v in data.ArmModelVersions
                where v.Id == armVersionId
                join a in data.ArmModels on v.ArmModelId equals a.Id
                select new { a.Name, v.Number }).SingleOrDefaultAsync(cancellation);
            if (arm is null)
                return new Refusal(RefusalKind.Invalid, "Choose the arm model the cell carries.");
            if (await data.CellSetups.AnyAsync(
                s => s.CellId == cellId && s.Number == cell.LatestSetupNumber && s.Sha256 == stored.Sha256 && s.ArmModelVersionId == armVersionId, cancellation))
                return DefinitionRefusals.NothingChanged(What);
            if (await MissingAsync(session, cellId, document, cancellation) is { } missing)
                return missing;

            var setup = cell.AddSetup(armVersionId, stored, noted.Value, actor.AccountId!.Value, session.Now);
            data.CellSetups.Add(setup);
            session.Tell(HistoryDraft.Of(cell.PlantId, What, cell.Id, "setup saved",
                ("name", cell.Name), ("setup", setup.Number.ToString(CultureInfo.InvariantCulture)),
                ("arm", $"{arm.Name}, version {arm.Number.ToString(CultureInfo.InvariantCulture)}"), ("sha256", stored.Sha256), ("note", noted.Value)));
            return setup;
        }, cancellation);
    }

    private static async Task<Refusal?> MissingAsync(PortalSession session, Guid cellId, CellSetupDocument document, CancellationToken cancellation)
    {
        var used = await (
            from a in session.Db.Assignments
            where a.CellId == cellId && a.RetiredAt == null
            join p in session.Db.Programs on a.ProgramId equals p.Id
            select new { p.Name, a.ToolName, a.WorkFrameName }).ToListAsync(cancellation);
        foreach (var use in used)
        {
            if (!document.Tools.Exists(t => t.Name == use.ToolName))
                return new(RefusalKind.Invalid, $"The program “{use.Name}” uses the tool “{use.ToolName}”; keep it, or change the assignment first.");
            if (!document.Frames.Exists(f => f.Name == use.WorkFrameName))
                return new(RefusalKind.Invalid, $"The program “{use.Name}” uses the work frame “{use.WorkFrameName}”; keep it, or change the assignment first.");
        }
        return null;
    }
}
