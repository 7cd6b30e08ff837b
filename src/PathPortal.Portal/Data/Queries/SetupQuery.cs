using Microsoft.EntityFrameworkCore;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.People;

namespace PathPortal.Portal.Data.Queries;

/// <summary>Plants, people, parts and what else a portal needs before its first program.</summary>
public sealed class SetupQuery(PortalDb db)
{
    public Task<Outcome<SetupOverview>> ReadAsync(Actor actor, CancellationToken cancellation = default) =>
        db.ReadAsync(actor, session => ReadAsync(session, cancellation), cancellation);

    private static async Task<Outcome<SetupOverview>> ReadAsync(PortalSession session, CancellationToken cancellation)
    {
        var visible = await VisiblePlants.OfAsync(session, cancellation);
        if (!visible.Succeeded)
            return visible.Refusal;
        var (data, ids) = (session.Db, visible.Value);
        var access = await session.AccessAsync(cancellation);
        var plants = await data.Plants.Where(p => ids.Contains(p.Id)).OrderBy(p => p.Name)
            .Select(p => new { Plant = p, Cells = data.Cells.Count(c => c.PlantId == p.Id && c.RetiredAt == null) }).ToListAsync(cancellation);
        return new SetupOverview(
            access.AdministersCompany, access.MaySomewhere(Right.EditPrograms),
            [.. plants.Select(p => new SetupOverview.Plant(
                p.Plant.Id, p.Plant.Name, p.Plant.TimeZone, p.Plant.ApprovalsRequired, p.Plant.ApprovingRoles, p.Cells,
                access.May(p.Plant.Id, Right.ManagePlant), access.May(p.Plant.Id, Right.EditPrograms)))],
            await PeopleAsync(data, access, ids, cancellation),
            await data.Parts.Where(p => p.RetiredAt == null).OrderBy(p => p.Name)
                .Select(p => new SetupOverview.Part(p.Id, p.Name, p.Note, data.Programs.Count(x => x.PartId == p.Id && x.RetiredAt == null))).ToListAsync(cancellation),
            await data.CriteriaSheets.Where(s => s.RetiredAt == null && s.LatestNumber > 0).OrderBy(s => s.Name)
                .Select(s => new SetupOverview.Sheet(s.Id, s.Name)).ToListAsync(cancellation),
            new(
                await data.ArmModels.CountAsync(a => a.RetiredAt == null && a.LatestNumber > 0, cancellation),
                await data.Cells.CountAsync(c => ids.Contains(c.PlantId) && c.RetiredAt == null, cancellation),
                await data.Cells.CountAsync(c => ids.Contains(c.PlantId) && c.RetiredAt == null && c.LatestSetupNumber > 0, cancellation),
                await data.CriteriaSheets.CountAsync(s => s.RetiredAt == null && s.LatestNumber > 0, cancellation),
                await data.Programs.CountAsync(p => ids.Contains(p.PlantId) && p.RetiredAt == null, cancellation),
                await data.Assignments.CountAsync(a => a.RetiredAt == null && data.Cells.Any(c => c.Id == a.CellId && ids.Contains(c.PlantId)), cancellation),
                await data.Revisions.CountAsync(r => data.Programs.Any(p => p.Id == r.ProgramId && ids.Contains(p.PlantId)), cancellation)));
    }

    private static async Task<IReadOnlyList<SetupOverview.Person>> PeopleAsync(PortalDbContext data, Access access, List<Guid> plants, CancellationToken cancellation)
    {
        if (!access.AdministersCompany && !access.MaySomewhere(Right.ManagePlant))
            return [];
        var roles = (await data.PlantRoles.Where(r => plants.Contains(r.PlantId)).ToListAsync(cancellation)).ToLookup(r => r.AccountId);
        var accounts = await data.Users.OrderBy(u => u.DisplayName).ThenBy(u => u.Id)
            .Select(u => new { u.Id, u.DisplayName, u.Email, u.AdministersCompany, u.DisabledAt }).ToListAsync(cancellation);
        return [.. accounts.Select(a => new SetupOverview.Person(
            a.Id, a.DisplayName, a.Email ?? "", a.AdministersCompany, a.DisabledAt,
            [.. roles[a.Id].OrderBy(r => r.PlantId).ThenBy(r => r.Role).Select(r => new SetupOverview.GivenRole(r.PlantId, r.Role))]))];
    }
}
