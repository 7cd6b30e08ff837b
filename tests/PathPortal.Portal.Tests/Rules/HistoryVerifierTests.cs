using System.Reflection;
using System.Text;
using PathPortal.Portal.Domain.History;

namespace PathPortal.Portal.Tests.Rules;

public sealed class HistoryVerifierTests
{
    // SHA-256 of the empty text: FIPS 180-4 example widely published; here it checks that the hash in use is that one.
    private const string EmptySha256 = "e3b0c44298fc1c149afbf4c8996fb92427ae41e4649b934ca495991b7852b855";

    [Fact]
    public void Sha256Text_Empty_IsThePublishedValue() => Assert.Equal(EmptySha256, PathPortal.Portal.Domain.Sha256Text.Of(""));

    [Fact]
    public void Finish_UntouchedChain_Holds()
    {
        var (entries, head) = Chain(5);
        Assert.Null(Verify(entries, head));
    }

    [Fact]
    public void HashLink_ByHand_IsTheSame()
    {
        var (entries, _) = Chain(2);
        var second = entries[1];
        byte[] preimage = [.. "pathportal history 1"u8, 0, 0, 0, 0, 0, 0, 0, 2, .. entries[0].Hash, .. second.ContentDigest];
        Assert.Equal(System.Security.Cryptography.SHA256.HashData(preimage), second.Hash);
        byte[] salted = [(byte)second.Salt.Length, .. second.Salt, .. second.Content];
        Assert.Equal(System.Security.Cryptography.SHA256.HashData(salted), second.ContentDigest);
    }

    [Fact]
    public void Content_IsCanonical_AndReadsBack()
    {
        var (entries, _) = Chain(1);
        var text = Encoding.UTF8.GetString(entries[0].Content);
        Assert.StartsWith("{\"sequence\":1,\"at\":\"2026-03-01T08:00:00.000000Z\",\"actor\":null,\"actorName\":\"test\"", text, StringComparison.Ordinal);
        Assert.Equal("ü \"quoted\" <b>", HistoryContent.ReadDetails(entries[0].Content).Single().Value);
    }

    public static TheoryData<string, long> Tampering() => new()
    {
        { "content", 3 }, { "content and its digest", 3 }, { "content, digest and hash", 4 }, { "column", 3 }, { "time", 3 },
        { "delete", 3 }, { "cut", 5 }, { "swap", 3 }, { "insert", 4 }, { "head", 5 },
    };

    [Theory]
    [MemberData(nameof(Tampering))]
    public void Finish_Tampered_SaysWhere(string how, long where)
    {
        var (entries, head) = Chain(5);
        var third = entries[2];
        switch (how)
        {
            case "content":
                Set(third, "Content", Encoding.UTF8.GetBytes("{}"));
                break;
            case "content and its digest":
                Set(third, "Content", Edited(third));
                Set(third, "ContentDigest", HistoryChain.DigestContent(third.Salt, third.Content));
                break;
            case "content, digest and hash":
                Set(third, "Content", Edited(third));
                Set(third, "ContentDigest", HistoryChain.DigestContent(third.Salt, third.Content));
                Set(third, "Hash", HistoryChain.HashLink(3, third.PreviousHash, third.ContentDigest));
                break;
            case "column":
                Set(third, "Action", "rejected");
                break;
            case "time":
                Set(third, "At", third.At.AddMicroseconds(1));
                break;
            case "delete":
                entries.RemoveAt(2);
                break;
            case "cut":
                entries.RemoveAt(4);
                break;
            case "swap":
                Set(entries[2], "Sequence", 4L);
                Set(entries[3], "Sequence", 3L);
                entries.Sort((a, b) => a.Sequence.CompareTo(b.Sequence));
                break;
            case "insert":
                var (other, _) = Chain(3);
                entries.Insert(3, other[2]);
                break;
            case "head":
                Set(head, "Hash", new byte[32]);
                break;
            default:
                Assert.Fail(how);
                break;
        }

        Assert.Equal(where, Verify(entries, head)?.Sequence);
    }

    [Fact]
    public void Finish_ChainRebuiltWhole_IsFoundOnlyByACheckpoint()
    {
        var (original, _) = Chain(5);
        var (rebuilt, head) = Chain(5, "somebody else");
        var checkpoint = new Dictionary<long, string> { [4] = Convert.ToHexStringLower(original[3].Hash) };

        Assert.Null(Verify(rebuilt, head));
        Assert.Equal(4, Verify(rebuilt, head, checkpoint)?.Sequence);
        Assert.Equal(4, Verify(rebuilt[..3], HeadAt(rebuilt[2]), checkpoint)?.Sequence);
    }

    private static HistoryBreak? Verify(IEnumerable<HistoryEntry> entries, HistoryHead head, IReadOnlyDictionary<long, string>? checkpoints = null)
    {
        var verifier = new HistoryVerifier(checkpoints);
        foreach (var entry in entries)
            verifier.Take(entry);
        return verifier.Finish(head);
    }

    private static (List<HistoryEntry> Entries, HistoryHead Head) Chain(int length, string actor = "test")
    {
        var head = HistoryHead.Empty();
        List<HistoryEntry> entries = [];
        for (var i = 0; i < length; i++)
        {
            entries.Add(HistoryChain.Append(
                head, HistoryDraft.Of(null, "review", Guid.Empty, "approved", ("reason", "ü \"quoted\" <b>"), ("left out", null)), null, actor,
                new DateTimeOffset(2026, 3, 1, 8, 0, 0, TimeSpan.Zero)));
        }
        return (entries, head);
    }

    private static HistoryHead HeadAt(HistoryEntry entry)
    {
        var head = HistoryHead.Empty();
        head.Advance(entry);
        return head;
    }

    private static byte[] Edited(HistoryEntry entry) =>
        Encoding.UTF8.GetBytes(Encoding.UTF8.GetString(entry.Content).Replace("quoted", "edited", StringComparison.Ordinal));

    private static void Set(object target, string property, object value) =>
        target.GetType().GetProperty(property, BindingFlags.Public | BindingFlags.Instance)!.SetValue(target, value);
}
