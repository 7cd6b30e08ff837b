namespace PathPortal.Portal.Data.Queries;

/// <summary>Some entries of the history, newest first.</summary>
/// <param name="Older">Sequence to go on before; null at the beginning.</param>
public sealed record HistoryPage(IReadOnlyList<HistoryLine> Lines, long? Older, IReadOnlyList<string> Kinds, long HeadSequence, string HeadHash);
