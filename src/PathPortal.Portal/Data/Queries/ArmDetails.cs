namespace PathPortal.Portal.Data.Queries;

/// <summary>One arm model with one version shown.</summary>
/// <param name="Versions">Newest first.</param>
/// <param name="Json">The document of the version shown.</param>
/// <param name="Cells">Cells the reader may see whose newest setup carries the arm.</param>
public sealed record ArmDetails(
    Guid Id, string Name, DateTimeOffset? RetiredAt, IReadOnlyList<VersionLine> Versions, VersionLine Shown, string Json,
    IReadOnlyList<ArmDetails.Cell> Cells, bool MayEdit)
{
    /// <param name="Version">Number of the arm version the setup carries.</param>
    public sealed record Cell(Guid Id, string Name, string Plant, int Version);
}
