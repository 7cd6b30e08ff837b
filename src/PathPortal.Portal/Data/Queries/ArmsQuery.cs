using Microsoft.EntityFrameworkCore;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.People;

namespace PathPortal.Portal.Data.Queries;

/// <summary>What the pages of arm models show. Arm models are the company's: whoever reads any plant reads them all.</summary>
public sealed class ArmsQuery(PortalDb db)
{
    public Task<Outcome<ArmList>> ListAsync(Actor actor, CancellationToken cancellation = default) => db.ReadAsync<Outcome<ArmList>>(actor, async session =>
    {
        var access = await session.AccessAsync(cancellation);
        if (access.RefuseShared(Right.Read) is { } refusal)
            return refusal;
        var lines = await session.Db.ArmModels.OrderBy(a => a.RetiredAt != null).ThenBy(a => a.Name).Select(a => new ArmList.Line(
            a.Id, a.Name, a.LatestNumber, a.RetiredAt,
            session.Db.ArmModelVersions.Where(v => v.ArmModelId == a.Id && v.Number == a.LatestNumber).Select(v => v.Json).FirstOrDefault(),
            session.Db.Cells.Count(c => c.RetiredAt == null && session.Db.CellSetups.Any(s => s.CellId == c.Id && s.Number == c.LatestSetupNumber
                && session.Db.ArmModelVersions.Any(v => v.Id == s.ArmModelVersionId && v.ArmModelId == a.Id))))).ToListAsync(cancellation);
        return new ArmList(lines, access.MaySomewhere(Right.EditArmModels));
    }, cancellation);

    /// <param name="number">The version to show; null for the newest.</param>
    public Task<Outcome<ArmDetails>> ReadAsync(Actor actor, Guid id, int? number, CancellationToken cancellation = default) => db.ReadAsync<Outcome<ArmDetails>>(actor, async session =>
    {
        var visible = await VisiblePlants.OfAsync(session, cancellation);
        if (!visible.Succeeded)
            return visible.Refusal;
        var access = await session.AccessAsync(cancellation);
        if (access.RefuseShared(Right.Read) is { } refusal)
            return refusal;
        var (data, plants) = (session.Db, visible.Value);
        var model = await data.ArmModels.SingleOrDefaultAsync(a => a.Id == id, cancellation);
        if (model is null)
            return Refusal.NotFound("arm model");
        var versions = await data.ArmModelVersions.Where(v => v.ArmModelId == id).OrderByDescending(v => v.Number).Select(v => new VersionLine(
            v.Id, v.Number, v.Sha256, v.Note, data.Users.Where(u => u.Id == v.CreatedBy).Select(u => u.DisplayName).FirstOrDefault() ?? "", v.CreatedAt)).ToListAsync(cancellation);
        var shown = number is null ? versions.FirstOrDefault() : versions.Find(v => v.Number == number);
        if (shown is null)
            return Refusal.NotFound("version of this arm model");
        var json = await data.ArmModelVersions.Where(v => v.Id == shown.Id).Select(v => v.Json).SingleAsync(cancellation);
        var cells = await (
            from c in data.Cells
            where c.RetiredAt == null && plants.Contains(c.PlantId)
            join s in data.CellSetups on new { Cell = c.Id, Number = c.LatestSetupNumber } equals new { Cell = s.CellId, s.Number }
            join v in data.ArmModelVersions on s.ArmModelVersionId equals v.Id
            where v.ArmModelId == id
            join p in data.Plants on c.PlantId equals p.Id
            orderby p.Name, c.Name
            select new ArmDetails.Cell(c.Id, c.Name, p.Name, v.Number)).ToListAsync(cancellation);
        return new ArmDetails(model.Id, model.Name, model.RetiredAt, versions, shown, json, cells, access.MaySomewhere(Right.EditArmModels));
    }, cancellation);
}
