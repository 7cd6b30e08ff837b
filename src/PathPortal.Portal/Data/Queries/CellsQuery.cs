using Microsoft.EntityFrameworkCore;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.People;

namespace PathPortal.Portal.Data.Queries;

/// <summary>What the pages of cells show: the cells of the plants the reader may see.</summary>
public sealed class CellsQuery(PortalDb db)
{
    public Task<Outcome<CellList>> ListAsync(Actor actor, CancellationToken cancellation = default) => db.ReadAsync<Outcome<CellList>>(actor, async session =>
    {
        var visible = await VisiblePlants.OfAsync(session, cancellation);
        if (!visible.Succeeded)
            return visible.Refusal;
        var (data, plants) = (session.Db, visible.Value);
        var access = await session.AccessAsync(cancellation);
        var lines = await (
            from c in data.Cells
            where plants.Contains(c.PlantId)
            join p in data.Plants on c.PlantId equals p.Id
            from s in data.CellSetups.Where(s => s.CellId == c.Id && s.Number == c.LatestSetupNumber).DefaultIfEmpty()
            from v in data.ArmModelVersions.Where(v => v.Id == s.ArmModelVersionId).DefaultIfEmpty()
            from a in data.ArmModels.Where(a => a.Id == v.ArmModelId).DefaultIfEmpty()
            orderby c.RetiredAt != null, p.Name, c.Name
            select new CellList.Line(
                c.Id, c.Name, p.Name, p.TimeZone, c.RetiredAt, c.LatestSetupNumber, s.CreatedAt, a.Id, a.Name, v.Number, a.LatestNumber,
                data.Assignments.Count(x => x.CellId == c.Id && x.RetiredAt == null))).ToListAsync(cancellation);
        var editable = await data.Plants.OrderBy(p => p.Name).Select(p => new CellList.Plant(p.Id, p.Name)).ToListAsync(cancellation);
        return new CellList(lines, [.. editable.Where(p => access.May(p.Id, Right.EditCells))]);
    }, cancellation);

    /// <param name="number">The setup to show; null for the newest.</param>
    public Task<Outcome<CellDetails>> ReadAsync(Actor actor, Guid id, int? number, CancellationToken cancellation = default) => db.ReadAsync<Outcome<CellDetails>>(actor, async session =>
    {
        var visible = await VisiblePlants.OfAsync(session, cancellation);
        if (!visible.Succeeded)
            return visible.Refusal;
        var data = session.Db;
        var access = await session.AccessAsync(cancellation);
        var cell = await (
            from c in data.Cells
            where c.Id == id && visible.Value.Contains(c.PlantId)
            join p in data.Plants on c.PlantId equals p.Id
            select new { c.Id, c.Name, c.PlantId, Plant = p.Name, p.TimeZone, c.RetiredAt }).SingleOrDefaultAsync(cancellation);
        if (cell is null)
            return Refusal.NotFound("cell");
        var setups = await data.CellSetups.Where(s => s.CellId == id).OrderByDescending(s => s.Number).Select(s => new VersionLine(
            s.Id, s.Number, s.Sha256, s.Note, data.Users.Where(u => u.Id == s.CreatedBy).Select(u => u.DisplayName).FirstOrDefault() ?? "", s.CreatedAt)).ToListAsync(cancellation);
        var shown = number is null ? setups.FirstOrDefault() : setups.Find(s => s.Number == number);
        if (shown is null && number is not null)
            return Refusal.NotFound("setup of this cell");
        var setup = shown is null ? null : await (
            from s in data.CellSetups
            where s.Id == shown.Id
            join v in data.ArmModelVersions on s.ArmModelVersionId equals v.Id
            join a in data.ArmModels on v.ArmModelId equals a.Id
            select new CellDetails.Setup(shown, s.Json, v.Id, a.Id, a.Name, v.Number, a.LatestNumber, v.Json)).SingleAsync(cancellation);
        var programs = await (
            from x in data.Assignments
            where x.CellId == id && x.RetiredAt == null
            join p in data.Programs on x.ProgramId equals p.Id
            orderby p.Name
            select new CellDetails.Program(p.Id, p.Name, x.ToolName, x.WorkFrameName)).ToListAsync(cancellation);
        return new CellDetails(
            cell.Id, cell.Name, cell.PlantId, cell.Plant, cell.TimeZone, cell.RetiredAt, setups, setup, programs, access.May(cell.PlantId, Right.EditCells));
    }, cancellation);

    /// <summary>Arm versions a setup may carry, newest of each model first.</summary>
    public Task<Outcome<IReadOnlyList<ArmChoice>>> ArmsAsync(Actor actor, CancellationToken cancellation = default) => db.ReadAsync<Outcome<IReadOnlyList<ArmChoice>>>(actor, async session =>
    {
        var access = await session.AccessAsync(cancellation);
        if (access.RefuseShared(Right.Read) is { } refusal)
            return refusal;
        return await (
            from v in session.Db.ArmModelVersions
            join a in session.Db.ArmModels on v.ArmModelId equals a.Id
            where a.RetiredAt == null
            orderby a.Name, v.Number descending
            select new ArmChoice(v.Id, a.Name, v.Number, v.Number == a.LatestNumber)).ToListAsync(cancellation);
    }, cancellation);
}
