namespace PathPortal.Portal.Domain.History;

/// <summary>Something to be told in the history, before it has a place in the chain.</summary>
/// <param name="PlantId">Null for what concerns the whole company.</param>
/// <param name="SubjectKind">What it is about, such as "revision".</param>
/// <param name="Action">What happened, such as "uploaded".</param>
/// <param name="Details">Names and values, in the order they are to be read.</param>
public sealed record HistoryDraft(
    Guid? PlantId, string SubjectKind, Guid SubjectId, string Action, IReadOnlyList<KeyValuePair<string, string>> Details)
{
    public static HistoryDraft Of(
        Guid? plantId, string subjectKind, Guid subjectId, string action, params (string Name, string? Value)[] details) =>
        new(plantId, subjectKind, subjectId, action,
            [.. details.Where(d => d.Value is not null).Select(d => KeyValuePair.Create(d.Name, d.Value!))]);
}
