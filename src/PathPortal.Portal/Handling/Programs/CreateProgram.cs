using Microsoft.EntityFrameworkCore;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.History;
using PathPortal.Portal.Domain.People;
using PathPortal.Portal.Domain.Programs;

namespace PathPortal.Portal.Handling.Programs;

/// <summary>Makes a path program of a part, still without revisions.</summary>
public sealed class CreateProgram(PortalDb db)
{
    /// <returns>The program's id.</returns>
    public async Task<Outcome<Guid>> HandleAsync(
        Actor actor, Guid plantId, Guid partId, string programName, string process, Guid criteriaSheetId, CancellationToken cancellation = default)
    {
        var name = Names.Name(programName, "program");
        var doing = Names.Name(process, "process");
        if ((name.Refusal ?? doing.Refusal) is { } wrong)
            return wrong;
        return await db.ActAsync<Guid>(actor, async session =>
        {
            var data = session.Db;
            if ((await session.AccessAsync(cancellation)).Refuse(plantId, Right.EditPrograms, "plant") is { } refusal)
                return refusal;
            var part = await data.Parts.SingleOrDefaultAsync(p => p.Id == partId && p.RetiredAt == null, cancellation);
            var sheet = await data.CriteriaSheets.SingleOrDefaultAsync(s => s.Id == criteriaSheetId && s.RetiredAt == null && s.LatestNumber > 0, cancellation);
            if (part is null)
                return new Refusal(RefusalKind.Invalid, "Choose the part the program is for.");
            if (sheet is null)
                return new Refusal(RefusalKind.Invalid, "Choose the criteria sheet the program is judged by.");
            if (await data.Programs.AnyAsync(p => p.PlantId == plantId && p.Name == name.Value, cancellation))
                return new Refusal(RefusalKind.Invalid, $"The plant has a program called “{name.Value}” already.");
            var program = new PathProgram(plantId, partId, name.Value, doing.Value, criteriaSheetId, actor.AccountId!.Value, session.Now);
            data.Programs.Add(program);
            session.Tell(HistoryDraft.Of(plantId, "program", program.Id, "created",
                ("name", program.Name), ("part", part.Name), ("process", program.Process), ("criteria", sheet.Name)));
            return program.Id;
        }, cancellation);
    }
}
