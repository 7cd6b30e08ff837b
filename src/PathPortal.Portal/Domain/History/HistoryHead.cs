namespace PathPortal.Portal.Domain.History;

/// <summary>The end of the chain: one row, locked by whoever appends.</summary>
public sealed class HistoryHead
{
    public const int OnlyId = 1;

    private HistoryHead()
    {
    }

    public int Id { get; private set; } = OnlyId;

    /// <summary>Sequence of the newest entry; 0 before the first.</summary>
    public long Sequence { get; private set; }

    public byte[] Hash { get; private set; } = [];

    public static HistoryHead Empty() => new() { Hash = [.. HistoryChain.Genesis] };

    internal void Advance(HistoryEntry entry)
    {
        Sequence = entry.Sequence;
        Hash = entry.Hash;
    }
}
