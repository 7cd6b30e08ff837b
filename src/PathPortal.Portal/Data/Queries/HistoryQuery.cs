using System.Text.Json;
using Microsoft.EntityFrameworkCore;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.History;

namespace PathPortal.Portal.Data.Queries;

/// <summary>Who did what, when and why, in the plants the reader may see and in what the company shares.</summary>
public sealed class HistoryQuery(PortalDb db)
{
    private const int PageSize = 50;

    /// <param name="before">Entries older than this one; null for the newest.</param>
    /// <param name="who">Part of a person's name; null for everybody.</param>
    public Task<Outcome<HistoryPage>> ReadAsync(
        Actor actor, long? before, string? who, string? kind, Guid? subjectId, CancellationToken cancellation = default) =>
        db.ReadAsync<Outcome<HistoryPage>>(actor, async session =>
        {
            var visible = await VisiblePlants.OfAsync(session, cancellation);
            if (!visible.Succeeded)
                return visible.Refusal;
            var (data, plants) = (session.Db, visible.Value);
            var administers = (await session.AccessAsync(cancellation)).AdministersCompany;
            // What concerns accounts without a plant is the administrators' business.
            var entries = data.History.Where(e => e.PlantId == null ? administers || e.SubjectKind != "account" : plants.Contains(e.PlantId.Value));
            var kinds = await entries.Select(e => e.SubjectKind).Distinct().OrderBy(k => k).ToListAsync(cancellation);
            if (before is { } limit)
                entries = entries.Where(e => e.Sequence < limit);
            if (!string.IsNullOrWhiteSpace(who))
                entries = entries.Where(e => EF.Functions.ILike(e.ActorName, "%" + Escape(who.Trim()) + "%", "\\"));
            if (!string.IsNullOrEmpty(kind))
                entries = entries.Where(e => e.SubjectKind == kind);
            if (subjectId is { } subject)
                entries = entries.Where(e => e.SubjectId == subject);
            var found = await entries.OrderByDescending(e => e.Sequence).Take(PageSize + 1)
                .Select(e => new { Entry = e, Plant = data.Plants.Where(p => p.Id == e.PlantId).Select(p => new { p.Name, p.TimeZone }).FirstOrDefault() })
                .ToListAsync(cancellation);
            var head = await data.HistoryHead.SingleAsync(cancellation);
            return new HistoryPage(
                [.. found.Take(PageSize).Select(f => new HistoryLine(
                    f.Entry.Sequence, f.Entry.At, f.Entry.ActorName, f.Plant?.Name, f.Plant?.TimeZone, f.Entry.SubjectKind, f.Entry.SubjectId, f.Entry.Action,
                    DetailsOf(f.Entry.Content), Convert.ToHexStringLower(f.Entry.Hash)))],
                found.Count > PageSize ? found[PageSize - 1].Entry.Sequence : null, kinds, head.Sequence, Convert.ToHexStringLower(head.Hash));
        }, cancellation);

    private static string Escape(string text) =>
        text.Replace("\\", "\\\\", StringComparison.Ordinal).Replace("%", "\\%", StringComparison.Ordinal).Replace("_", "\\_", StringComparison.Ordinal);

    // A damaged entry must still be listed; that it is damaged is for verification to say.
    private static IReadOnlyList<KeyValuePair<string, string>> DetailsOf(byte[] content)
    {
        try
        {
            return HistoryContent.ReadDetails(content);
        }
        catch (Exception e) when (e is JsonException or KeyNotFoundException or InvalidOperationException)
        {
            return [];
        }
    }
}
