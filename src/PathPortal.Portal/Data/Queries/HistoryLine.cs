namespace PathPortal.Portal.Data.Queries;

/// <summary>One entry of the history, to be read.</summary>
/// <param name="Plant">Null for what concerns the whole company.</param>
/// <param name="Details">Names and values in the order they were written.</param>
public sealed record HistoryLine(
    long Sequence, DateTimeOffset At, string Actor, string? Plant, string? TimeZone, string SubjectKind, Guid SubjectId, string Action,
    IReadOnlyList<KeyValuePair<string, string>> Details, string Hash);
