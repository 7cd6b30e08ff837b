using Microsoft.EntityFrameworkCore;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.Fleet;
using PathPortal.Portal.Domain.History;
using PathPortal.Portal.Domain.People;

namespace PathPortal.Portal.Handling.Programs;

/// <summary>Names a part; the whole company shares it.</summary>
public sealed class CreatePart(PortalDb db)
{
    /// <returns>The part's id.</returns>
    public async Task<Outcome<Guid>> HandleAsync(Actor actor, string partName, string note, CancellationToken cancellation = default)
    {
        var name = Names.Name(partName, "part");
        var noted = Names.Note(note);
        if ((name.Refusal ?? noted.Refusal) is { } wrong)
            return wrong;
        return await db.ActAsync<Guid>(actor, async session =>
        {
            if ((await session.AccessAsync(cancellation)).RefuseShared(Right.EditPrograms) is { } refusal)
                return refusal;
            if (await session.Db.Parts.AnyAsync(p => p.Name == name.Value, cancellation))
                return new Refusal(RefusalKind.Invalid, $"There is a part called “{name.Value}” already.");
            var part = new Part(name.Value, noted.Value, session.Now);
            session.Db.Parts.Add(part);
            session.Tell(HistoryDraft.Of(null, "part", part.Id, "created", ("name", part.Name)));
            return part.Id;
        }, cancellation);
    }
}
