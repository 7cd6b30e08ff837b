using System.Buffers.Binary;
using System.Security.Cryptography;

namespace PathPortal.Portal.Domain.History;

/// <summary>
/// The arithmetic of the chain. A link covers its sequence, the link before and the salted digest of its content, so the chain can be
/// followed by somebody who may not read the contents.
/// </summary>
public static class HistoryChain
{
    private static readonly byte[] Domain = "pathportal history 1"u8.ToArray();

    /// <summary>The hash before the first entry.</summary>
    public static ReadOnlySpan<byte> Genesis => new byte[32];

    public static byte[] DigestContent(ReadOnlySpan<byte> salt, ReadOnlySpan<byte> content)
    {
        using var hash = IncrementalHash.CreateHash(HashAlgorithmName.SHA256);
        // The length keeps salt and content from being shifted against each other.
        hash.AppendData([(byte)salt.Length]);
        hash.AppendData(salt);
        hash.AppendData(content);
        return hash.GetHashAndReset();
    }

    public static byte[] HashLink(long sequence, ReadOnlySpan<byte> previousHash, ReadOnlySpan<byte> contentDigest)
    {
        Span<byte> number = stackalloc byte[8];
        BinaryPrimitives.WriteInt64BigEndian(number, sequence);
        using var hash = IncrementalHash.CreateHash(HashAlgorithmName.SHA256);
        hash.AppendData(Domain);
        hash.AppendData(number);
        hash.AppendData(previousHash);
        hash.AppendData(contentDigest);
        return hash.GetHashAndReset();
    }

    /// <summary>Makes the next link and moves the head on to it. The head's row is locked by the caller.</summary>
    public static HistoryEntry Append(HistoryHead head, HistoryDraft draft, Guid? actorId, string actorName, DateTimeOffset at)
    {
        var entry = HistoryEntry.Create(head.Sequence + 1, head.Hash, draft, actorId, actorName, RandomNumberGenerator.GetBytes(16), at);
        head.Advance(entry);
        return entry;
    }
}
