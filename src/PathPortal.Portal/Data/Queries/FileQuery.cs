using Microsoft.EntityFrameworkCore;
using PathPortal.Portal.Domain;

namespace PathPortal.Portal.Data.Queries;

/// <summary>The bytes of stored files, for those who may read what they belong to.</summary>
public sealed class FileQuery(PortalDb db)
{
    public Task<Outcome<StoredFile>> RevisionAsync(Actor actor, Guid id, CancellationToken cancellation = default) =>
        db.ReadAsync<Outcome<StoredFile>>(actor, async session =>
        {
            var visible = await VisiblePlants.OfAsync(session, cancellation);
            if (!visible.Succeeded)
                return visible.Refusal;
            var (data, plants) = (session.Db, visible.Value);
            var found = await (
                from r in data.Revisions
                where r.Id == id
                join p in data.Programs on r.ProgramId equals p.Id
                where plants.Contains(p.PlantId)
                    || data.Assignments.Any(a => a.ProgramId == p.Id && a.RetiredAt == null && data.Cells.Any(c => c.Id == a.CellId && plants.Contains(c.PlantId)))
                select new StoredFile(r.FileName, r.Source, r.Sha256)).SingleOrDefaultAsync(cancellation);
            return found is null ? Refusal.NotFound("revision") : found;
        }, cancellation);

    public Task<Outcome<StoredFile>> ControllerFileAsync(Actor actor, Guid id, CancellationToken cancellation = default) =>
        db.ReadAsync<Outcome<StoredFile>>(actor, async session =>
        {
            var visible = await VisiblePlants.OfAsync(session, cancellation);
            if (!visible.Succeeded)
                return visible.Refusal;
            var (data, plants) = (session.Db, visible.Value);
            var found = await data.ControllerFiles
                .Where(f => f.Id == id && data.Cells.Any(c => c.Id == f.CellId && plants.Contains(c.PlantId)))
                .Select(f => new StoredFile(f.FileName, f.Bytes, f.Sha256)).SingleOrDefaultAsync(cancellation);
            return found is null ? Refusal.NotFound("controller file") : found;
        }, cancellation);
}
