using System.Globalization;

namespace PathPortal.Portal.Domain.History;

/// <summary>Walks the chain from its beginning, entry by entry, and remembers the first place where it does not hold.</summary>
public sealed class HistoryVerifier
{
    private readonly Dictionary<long, string> _checkpoints;
    private byte[] _hash = [.. HistoryChain.Genesis];

    /// <param name="checkpoints">Hashes (hexadecimal) by sequence, from records kept elsewhere. Without them a chain that was rebuilt whole passes.</param>
    public HistoryVerifier(IReadOnlyDictionary<long, string>? checkpoints = null)
    {
        _checkpoints = checkpoints is null ? [] : new(checkpoints);
    }

    /// <summary>Entries that hold so far.</summary>
    public long Count { get; private set; }

    public string LastHash => Convert.ToHexStringLower(_hash);

    public HistoryBreak? Break { get; private set; }

    /// <summary>Takes the next entry in order of sequence; false once the chain is broken.</summary>
    public bool Take(HistoryEntry entry)
    {
        if (Break is not null)
            return false;
        var expected = Count + 1;
        var fault = entry.Sequence != expected ? $"entry {Number(expected)} is missing; the next one there is {Number(entry.Sequence)}"
            : !entry.PreviousHash.AsSpan().SequenceEqual(_hash) ? "it does not follow the entry before it"
            : !entry.ContentDigest.AsSpan().SequenceEqual(HistoryChain.DigestContent(entry.Salt, entry.Content)) ? "its content was changed"
            : !entry.Hash.AsSpan().SequenceEqual(HistoryChain.HashLink(entry.Sequence, _hash, entry.ContentDigest)) ? "its hash is wrong"
            : HistoryContent.FirstDifference(entry) is { } column ? $"its column \"{column}\" says something else than its content"
            : _checkpoints.TryGetValue(entry.Sequence, out var known) && known != Convert.ToHexStringLower(entry.Hash)
                ? "it differs from the checkpoint kept elsewhere"
            : null;
        if (fault is not null)
        {
            Break = new(expected, fault);
            return false;
        }
        Count = expected;
        _hash = entry.Hash;
        return true;
    }

    /// <summary>After the last entry: compares the end with the head and with the checkpoints. Null when everything holds.</summary>
    public HistoryBreak? Finish(HistoryHead? head)
    {
        if (Break is not null)
            return Break;
        if (head is null)
            Break = new(Count, "the head of the chain is missing");
        else if (head.Sequence > Count)
            Break = new(Count + 1, $"the chain ends here, but its head stands at {Number(head.Sequence)}: entries were cut off");
        else if (head.Sequence < Count)
            Break = new(head.Sequence + 1, $"the head stands at {Number(head.Sequence)}, before this entry");
        else if (!head.Hash.AsSpan().SequenceEqual(_hash))
            Break = new(Count, "the head's hash is not that of the last entry");
        else if (_checkpoints.Keys.Where(s => s > Count).Order().FirstOrDefault() is > 0 and var beyond)
            Break = new(Count + 1, $"a checkpoint kept elsewhere knows entry {Number(beyond)}: entries were cut off");
        return Break;
    }

    private static string Number(long value) => value.ToString(CultureInfo.InvariantCulture);
}
