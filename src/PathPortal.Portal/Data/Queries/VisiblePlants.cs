using Microsoft.EntityFrameworkCore;
using PathPortal.Portal.Domain;

namespace PathPortal.Portal.Data.Queries;

/// <summary>The plants the acting account may read, the common first step of every query.</summary>
internal static class VisiblePlants
{
    /// <summary>Ids of the plants, or why the account reads nothing at all.</summary>
    public static async Task<Outcome<List<Guid>>> OfAsync(PortalSession session, CancellationToken cancellation)
    {
        var access = await session.AccessAsync(cancellation);
        if (!access.Enabled)
            return new Refusal(RefusalKind.NotAllowed, "This account is disabled.");
        return access.AdministersCompany
            ? await session.Db.Plants.Select(p => p.Id).ToListAsync(cancellation)
            : access.Plants.ToList();
    }
}
