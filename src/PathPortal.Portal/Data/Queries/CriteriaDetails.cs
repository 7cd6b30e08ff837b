namespace PathPortal.Portal.Data.Queries;

/// <summary>One criteria sheet with one version shown.</summary>
/// <param name="Versions">Newest first.</param>
/// <param name="Json">The document of the version shown.</param>
public sealed record CriteriaDetails(
    Guid Id, string Name, DateTimeOffset? RetiredAt, IReadOnlyList<VersionLine> Versions, VersionLine Shown, string Json,
    IReadOnlyList<CriteriaDetails.Program> Programs, bool MayEdit)
{
    public sealed record Program(Guid Id, string Name);
}
