using System.Globalization;
using Microsoft.EntityFrameworkCore;
using PathPortal.Formats.Documents;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.Fleet;
using PathPortal.Portal.Domain.History;
using PathPortal.Portal.Domain.People;

namespace PathPortal.Portal.Handling.Fleet;

/// <summary>Saves a new criteria sheet or a new version of one.</summary>
public sealed class SaveCriteriaSheet(PortalDb db)
{
    private const string What = "criteria sheet";

    /// <param name="id">Null for a new sheet.</param>
    /// <param name="basedOn">Number of the version the changes started from; null for a new sheet.</param>
    /// <returns>The sheet's id.</returns>
    public async Task<Outcome<Guid>> HandleAsync(
        Actor actor, Guid? id, int? basedOn, string sheetName, CriteriaDocument document, string note, CancellationToken cancellation = default)
    {
        ArgumentNullException.ThrowIfNull(document);
        var name = Names.Name(sheetName, What);
        var noted = Names.Note(note);
        if ((name.Refusal ?? noted.Refusal ?? DefinitionRefusals.OfProblems(document.Validate())) is { } wrong)
            return wrong;
        var stored = StoredDocument.Of(document.ToJson());

        return await db.ActAsync<Guid>(actor, async session =>
        {
            if ((await session.AccessAsync(cancellation)).RefuseShared(Right.EditCriteria) is { } refusal)
                return refusal;
            var sheets = session.Db.CriteriaSheets;
            if (await sheets.AnyAsync(m => m.Name == name.Value && m.Id != id, cancellation))
                return new Refusal(RefusalKind.Invalid, $"There is a criteria sheet called “{name.Value}” already.");
            CriteriaSheetRecord? sheet;
            if (id is null)
            {
                sheet = new CriteriaSheetRecord(name.Value, session.Now);
                sheets.Add(sheet);
            }
            else
            {
                sheet = await sheets.SingleOrDefaultAsync(m => m.Id == id, cancellation);
                if (sheet is null)
                    return Refusal.NotFound(What);
                if (sheet.RetiredAt is not null)
                    return DefinitionRefusals.Retired(What);
                if (DefinitionRefusals.OfVersion(sheet.LatestNumber, basedOn, What) is { } stale)
                    return stale;
                if (sheet.Name == name.Value
                    && await session.Db.CriteriaSheetVersions.AnyAsync(v => v.CriteriaSheetId == id && v.Number == sheet.LatestNumber && v.Sha256 == stored.Sha256, cancellation))
                    return DefinitionRefusals.NothingChanged(What);
                sheet.Rename(name.Value);
            }
            var version = sheet.AddVersion(stored, noted.Value, actor.AccountId!.Value, session.Now);
            session.Db.CriteriaSheetVersions.Add(version);
            session.Tell(HistoryDraft.Of(null, What, sheet.Id, "version saved",
                ("name", sheet.Name), ("version", version.Number.ToString(CultureInfo.InvariantCulture)), ("sha256", stored.Sha256), ("note", noted.Value)));
            return sheet.Id;
        }, cancellation);
    }
}
