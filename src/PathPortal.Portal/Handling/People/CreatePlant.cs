using Microsoft.EntityFrameworkCore;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.Fleet;
using PathPortal.Portal.Domain.History;
using PathPortal.Portal.Domain.People;

namespace PathPortal.Portal.Handling.People;

/// <summary>Founds a plant. One approval by a cell owner or lead is its rule until an administrator sets another.</summary>
public sealed class CreatePlant(PortalDb db)
{
    /// <param name="timeZone">IANA name.</param>
    /// <returns>The plant's id.</returns>
    public async Task<Outcome<Guid>> HandleAsync(Actor actor, string plantName, string timeZone, CancellationToken cancellation = default)
    {
        var name = Names.Name(plantName, "plant");
        if (!name.Succeeded)
            return name.Refusal;
        if (!TimeZoneInfo.TryFindSystemTimeZoneById(timeZone ?? "", out var zone) || !zone.HasIanaId)
            return new Refusal(RefusalKind.Invalid, "Choose a time zone by its IANA name, such as Europe/Prague.");
        return await db.ActAsync<Guid>(actor, async session =>
        {
            if (!(await session.AccessAsync(cancellation)).AdministersCompany)
                return new Refusal(RefusalKind.NotAllowed, "Only a company administrator founds plants.");
            if (await session.Db.Plants.AnyAsync(p => p.Name == name.Value, cancellation))
                return new Refusal(RefusalKind.Invalid, $"There is a plant called “{name.Value}” already.");
            var plant = new Plant(name.Value, zone.Id, 1, [Role.CellOwner, Role.Lead], session.Now);
            session.Db.Plants.Add(plant);
            session.Tell(HistoryDraft.Of(plant.Id, "plant", plant.Id, "founded", ("name", plant.Name), ("time zone", plant.TimeZone)));
            return plant.Id;
        }, cancellation);
    }
}
