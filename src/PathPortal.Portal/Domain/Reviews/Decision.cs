namespace PathPortal.Portal.Domain.Reviews;

/// <summary>One person's approval or rejection, and everything it rests on. Never changes.</summary>
public sealed class Decision
{
    internal Decision(
        Review review, DecisionKind kind, Guid by, Guid uploadedBy, Evidence evidence, Guid runRequestId, string meaning, string reason,
        DateTimeOffset at)
    {
        Id = Guid.CreateVersion7(at);
        ReviewId = review.Id;
        Round = review.Round;
        Kind = kind;
        DecidedBy = by;
        DecidedAt = at;
        UploadedBy = uploadedBy;
        SubmittedBy = review.SubmittedBy!.Value;
        RunRequestId = runRequestId;
        RevisionSha256 = evidence.RevisionSha256;
        SetupSha256 = evidence.SetupSha256;
        CriteriaSha256 = evidence.CriteriaSha256;
        RunDigest = evidence.RunDigest;
        ControllerFileSha256 = evidence.ControllerFileSha256;
        Meaning = meaning;
        Reason = reason;
    }

    private Decision()
    {
    }

    public Guid Id { get; private set; }

    public Guid ReviewId { get; private set; }

    /// <summary>The round of review it belongs to; earlier rounds no longer count.</summary>
    public int Round { get; private set; }

    public DecisionKind Kind { get; private set; }

    public Guid DecidedBy { get; private set; }

    public DateTimeOffset DecidedAt { get; private set; }

    /// <summary>Who uploaded the revision and who submitted it: kept here so that the database can hold four eyes by itself.</summary>
    public Guid UploadedBy { get; private set; }

    public Guid SubmittedBy { get; private set; }

    /// <summary>The request whose run was the evidence.</summary>
    public Guid RunRequestId { get; private set; }

    public string RevisionSha256 { get; private set; } = "";

    public string SetupSha256 { get; private set; } = "";

    public string CriteriaSha256 { get; private set; } = "";

    public string RunDigest { get; private set; } = "";

    public string? ControllerFileSha256 { get; private set; }

    /// <summary>What the signature means, as the decider read it.</summary>
    public string Meaning { get; private set; } = "";

    public string Reason { get; private set; } = "";

    /// <summary>The run's samples, packed, once and for ever; lists must not select them.</summary>
    public byte[]? Samples { get; private set; }

    /// <summary>Digest of <see cref="Samples"/> as stored.</summary>
    public string? SamplesSha256 { get; private set; }

    public Evidence Evidence => new(RevisionSha256, SetupSha256, CriteriaSha256, RunDigest, ControllerFileSha256);

    /// <summary>Keeps the samples the decision rests on; before the decision is stored, and once.</summary>
    public void KeepSamples(byte[] packed)
    {
        if (Samples is not null)
            throw new InvalidOperationException("The samples of a decision are kept once.");
        Samples = packed;
        SamplesSha256 = Sha256Text.Of(packed);
    }
}
