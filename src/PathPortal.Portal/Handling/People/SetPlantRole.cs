using Microsoft.EntityFrameworkCore;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.History;
using PathPortal.Portal.Domain.People;

namespace PathPortal.Portal.Handling.People;

/// <summary>Gives an account a role in a plant, or takes it.</summary>
public sealed class SetPlantRole(PortalDb db)
{
    /// <returns>True when something changed.</returns>
    public async Task<Outcome<bool>> HandleAsync(
        Actor actor, Guid accountId, Guid plantId, Role role, bool given, CancellationToken cancellation = default) =>
        await db.ActAsync<bool>(actor, async session =>
        {
            var access = await session.AccessAsync(cancellation);
            if (access.Refuse(plantId, Right.ManagePlant, "plant") is { } refusal)
                return refusal;
            if (access.AccountId == accountId && !access.AdministersCompany)
                return new Refusal(RefusalKind.FourEyes, "Nobody changes their own roles; another administrator has to.");
            var account = await session.Db.Users.AsNoTracking().SingleOrDefaultAsync(a => a.Id == accountId, cancellation);
            if (account is null || !await session.Db.Plants.AnyAsync(p => p.Id == plantId, cancellation))
                return Refusal.NotFound(account is null ? "account" : "plant");
            var present = await session.Db.PlantRoles.SingleOrDefaultAsync(
                r => r.AccountId == accountId && r.PlantId == plantId && r.Role == role, cancellation);
            if (present is null != given)
                return false;
            if (present is null)
                session.Db.PlantRoles.Add(new PlantRole(accountId, plantId, role, session.Now));
            else
                session.Db.PlantRoles.Remove(present);
            session.Tell(HistoryDraft.Of(plantId, "account", accountId, given ? "role given" : "role taken",
                ("account", account.DisplayName), ("email", account.Email), ("role", role.ToString())));
            return true;
        }, cancellation);
}
