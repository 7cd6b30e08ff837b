using Microsoft.EntityFrameworkCore;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.People;

namespace PathPortal.Portal.Data.Queries;

/// <summary>What the pages of criteria sheets show. Sheets are the company's: whoever reads any plant reads them all.</summary>
public sealed class CriteriaQuery(PortalDb db)
{
    public Task<Outcome<CriteriaList>> ListAsync(Actor actor, CancellationToken cancellation = default) => db.ReadAsync<Outcome<CriteriaList>>(actor, async session =>
    {
        var access = await session.AccessAsync(cancellation);
        if (access.RefuseShared(Right.Read) is { } refusal)
            return refusal;
        var lines = await session.Db.CriteriaSheets.OrderBy(c => c.RetiredAt != null).ThenBy(c => c.Name).Select(c => new CriteriaList.Line(
            c.Id, c.Name, c.LatestNumber, c.RetiredAt,
            session.Db.CriteriaSheetVersions.Where(v => v.CriteriaSheetId == c.Id && v.Number == c.LatestNumber).Select(v => v.Json).FirstOrDefault(),
            session.Db.Programs.Count(p => p.RetiredAt == null && p.CriteriaSheetId == c.Id))).ToListAsync(cancellation);
        return new CriteriaList(lines, access.MaySomewhere(Right.EditCriteria));
    }, cancellation);

    /// <param name="number">The version to show; null for the newest.</param>
    public Task<Outcome<CriteriaDetails>> ReadAsync(Actor actor, Guid id, int? number, CancellationToken cancellation = default) => db.ReadAsync<Outcome<CriteriaDetails>>(actor, async session =>
    {
        var visible = await VisiblePlants.OfAsync(session, cancellation);
        if (!visible.Succeeded)
            return visible.Refusal;
        var access = await session.AccessAsync(cancellation);
        if (access.RefuseShared(Right.Read) is { } refusal)
            return refusal;
        var (data, plants) = (session.Db, visible.Value);
        var sheet = await data.CriteriaSheets.SingleOrDefaultAsync(c => c.Id == id, cancellation);
        if (sheet is null)
            return Refusal.NotFound("criteria sheet");
        var versions = await data.CriteriaSheetVersions.Where(v => v.CriteriaSheetId == id).OrderByDescending(v => v.Number).Select(v => new VersionLine(
            v.Id, v.Number, v.Sha256, v.Note, data.Users.Where(u => u.Id == v.CreatedBy).Select(u => u.DisplayName).FirstOrDefault() ?? "", v.CreatedAt)).ToListAsync(cancellation);
        var shown = number is null ? versions.FirstOrDefault() : versions.Find(v => v.Number == number);
        if (shown is null)
            return Refusal.NotFound("version of this sheet");
        var json = await data.CriteriaSheetVersions.Where(v => v.Id == shown.Id).Select(v => v.Json).SingleAsync(cancellation);
        var programs = await data.Programs.Where(p => p.CriteriaSheetId == id && p.RetiredAt == null && plants.Contains(p.PlantId)).OrderBy(p => p.Name)
            .Select(p => new CriteriaDetails.Program(p.Id, p.Name)).ToListAsync(cancellation);
        return new CriteriaDetails(sheet.Id, sheet.Name, sheet.RetiredAt, versions, shown, json, programs, access.MaySomewhere(Right.EditCriteria));
    }, cancellation);
}
