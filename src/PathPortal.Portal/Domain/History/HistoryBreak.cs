namespace PathPortal.Portal.Domain.History;

/// <summary>Where the chain does not hold, and what is wrong there.</summary>
/// <param name="Sequence">The entry, or the one that should be there.</param>
public sealed record HistoryBreak(long Sequence, string Reason);
