namespace PathPortal.Portal.Domain.History;

/// <summary>
/// One link of the chain. The columns beside <see cref="Content"/> are there to be searched; verification compares them with it.
/// </summary>
public sealed class HistoryEntry
{
    private HistoryEntry()
    {
    }

    /// <summary>From 1, without gaps.</summary>
    public long Sequence { get; private set; }

    public DateTimeOffset At { get; private set; }

    /// <summary>Null when no account acted but a process did.</summary>
    public Guid? ActorId { get; private set; }

    public string ActorName { get; private set; } = "";

    public Guid? PlantId { get; private set; }

    public string SubjectKind { get; private set; } = "";

    public Guid SubjectId { get; private set; }

    public string Action { get; private set; } = "";

    /// <summary>Canonical UTF-8 JSON of everything above and the details: the bytes that are hashed.</summary>
    public byte[] Content { get; private set; } = [];

    /// <summary>Random; keeps short contents from being guessed from their digest.</summary>
    public byte[] Salt { get; private set; } = [];

    /// <summary>SHA-256 of salt and content.</summary>
    public byte[] ContentDigest { get; private set; } = [];

    public byte[] PreviousHash { get; private set; } = [];

    /// <summary>SHA-256 over sequence, previous hash and content digest.</summary>
    public byte[] Hash { get; private set; } = [];

    internal static HistoryEntry Create(
        long sequence, byte[] previousHash, HistoryDraft draft, Guid? actorId, string actorName, byte[] salt, DateTimeOffset at)
    {
        var entry = new HistoryEntry
        {
            Sequence = sequence,
            // The database keeps microseconds; what is hashed must not say more than what is stored.
            At = new DateTimeOffset(at.UtcTicks - (at.UtcTicks % TimeSpan.TicksPerMicrosecond), TimeSpan.Zero),
            ActorId = actorId,
            ActorName = actorName,
            PlantId = draft.PlantId,
            SubjectKind = draft.SubjectKind,
            SubjectId = draft.SubjectId,
            Action = draft.Action,
            Salt = salt,
            PreviousHash = previousHash,
        };
        entry.Content = HistoryContent.Write(entry, draft.Details);
        entry.ContentDigest = HistoryChain.DigestContent(salt, entry.Content);
        entry.Hash = HistoryChain.HashLink(sequence, previousHash, entry.ContentDigest);
        return entry;
    }
}
