using PathPortal.Portal.Domain.History;

namespace PathPortal.Portal.Handling.History;

/// <summary>Outcome of following the chain.</summary>
/// <param name="Count">Entries that hold, from the first.</param>
/// <param name="LastHash">Hash of the last one that holds, hexadecimal: note it elsewhere to check against later.</param>
/// <param name="Break">Null when all of it holds.</param>
public sealed record HistoryReport(long Count, string LastHash, HistoryBreak? Break);
