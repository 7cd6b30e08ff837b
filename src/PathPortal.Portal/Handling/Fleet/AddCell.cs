using Microsoft.EntityFrameworkCore;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.Fleet;
using PathPortal.Portal.Domain.History;
using PathPortal.Portal.Domain.People;

namespace PathPortal.Portal.Handling.Fleet;

/// <summary>Adds a cell to a plant, still without a setup.</summary>
public sealed class AddCell(PortalDb db)
{
    /// <returns>The cell's id.</returns>
    public async Task<Outcome<Guid>> HandleAsync(Actor actor, Guid plantId, string cellName, CancellationToken cancellation = default)
    {
        var name = Names.Name(cellName, "cell");
        if (!name.Succeeded)
            return name.Refusal;
        return await db.ActAsync<Guid>(actor, async session =>
        {
            if ((await session.AccessAsync(cancellation)).Refuse(plantId, Right.EditCells, "plant") is { } refusal)
                return refusal;
            if (!await session.Db.Plants.AnyAsync(p => p.Id == plantId, cancellation))
                return Refusal.NotFound("plant");
            if (await session.Db.Cells.AnyAsync(c => c.PlantId == plantId && c.Name == name.Value, cancellation))
                return new Refusal(RefusalKind.Invalid, $"The plant has a cell called “{name.Value}” already.");
            var cell = new Cell(plantId, name.Value, session.Now);
            session.Db.Cells.Add(cell);
            session.Tell(HistoryDraft.Of(plantId, "cell", cell.Id, "added", ("name", cell.Name)));
            return cell.Id;
        }, cancellation);
    }
}
