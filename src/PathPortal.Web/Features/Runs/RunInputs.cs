namespace PathPortal.Web.Features.Runs;

/// <summary>What a run was computed from, by name, version and digest. Digests are hexadecimal SHA-256.</summary>
public sealed record RunInputs
{
    public required Input Program { get; init; }

    public required Input Revision { get; init; }

    public required Input Cell { get; init; }

    public required Input Setup { get; init; }

    public required Input Arm { get; init; }

    public required Input Criteria { get; init; }

    public required string Plant { get; init; }

    /// <summary>IANA zone of the plant.</summary>
    public required string Zone { get; init; }

    public required string Tool { get; init; }

    public required string WorkFrame { get; init; }

    /// <summary>Digest of everything the run depends on.</summary>
    public required string Digest { get; init; }

    public required int NumericsVersion { get; init; }

    /// <summary>Null until there is a result.</summary>
    public DateTimeOffset? FinishedAt { get; init; }

    public string? Worker { get; init; }

    /// <summary>Address of the review that rests on this revision and cell; null where there is none.</summary>
    public string? Review { get; init; }

    /// <param name="Href">Null where there is no page for it.</param>
    /// <param name="Sha256">Null where a digest says nothing, such as for a program.</param>
    public sealed record Input(string Text, string? Href = null, string? Sha256 = null);
}
