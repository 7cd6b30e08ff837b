using Microsoft.EntityFrameworkCore;
using PathPortal.Formats.Documents;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.Fleet;
using PathPortal.Portal.Domain.History;
using PathPortal.Portal.Domain.People;

namespace PathPortal.Portal.Handling.Fleet;

/// <summary>Saves a new arm model or a new version of one. The document's name is the model's.</summary>
public sealed class SaveArmModel(PortalDb db)
{
    private const string What = "arm model";

    /// <param name="id">Null for a new model.</param>
    /// <param name="basedOn">Number of the version the changes started from; null for a new model.</param>
    /// <returns>The model's id.</returns>
    public async Task<Outcome<Guid>> HandleAsync(Actor actor, Guid? id, int? basedOn, ArmDocument document, string note, CancellationToken cancellation = default)
    {
        ArgumentNullException.ThrowIfNull(document);
        var name = Names.Name(document.Name, What);
        var noted = Names.Note(note);
        if ((name.Refusal ?? noted.Refusal ?? DefinitionRefusals.OfProblems(document.Validate())) is { } wrong)
            return wrong;
        var stored = StoredDocument.Of(document.ToJson());

        return await db.ActAsync<Guid>(actor, async session =>
        {
            if ((await session.AccessAsync(cancellation)).RefuseShared(Right.EditArmModels) is { } refusal)
                return refusal;
            var models = session.Db.ArmModels;
            if (await models.AnyAsync(m => m.Name == name.Value && m.Id != id, cancellation))
                return new Refusal(RefusalKind.Invalid, $"There is an arm model called “{name.Value}” already.");
            ArmModelRecord? model;
            if (id is null)
            {
                model = new ArmModelRecord(name.Value, session.Now);
                models.Add(model);
            }
            else
            {
                model = await models.SingleOrDefaultAsync(m => m.Id == id, cancellation);
                if (model is null)
                    return Refusal.NotFound(What);
                if (model.RetiredAt is not null)
                    return DefinitionRefusals.Retired(What);
                if (DefinitionRefusals.OfVersion(model.LatestNumber, basedOn, What) is { } stale)
                    return stale;
                if (await session.Db.ArmModelVersions.AnyAsync(v => v.ArmModelId == id && v.Number == model.LatestNumber && v.Sha256 == stored.Sha256, cancellation))
                    return DefinitionRefusals.NothingChanged(What);
                model.Rename(name.Value);
            }
            var version = model.AddVersion(stored, noted.Value, actor.AccountId!.Value, session.Now);
            session.Db.ArmModelVersions.Add(version);
            session.Tell(HistoryDraft.Of(null, What, model.Id, "version saved",
                ("name", model.Name), ("version", version.Number.ToString(System.Globalization.CultureInfo.InvariantCulture)), ("sha256", stored.Sha256), ("note", noted.Value)));
            return model.Id;
        }, cancellation);
    }
}
