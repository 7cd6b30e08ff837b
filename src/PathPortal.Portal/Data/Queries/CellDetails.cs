namespace PathPortal.Portal.Data.Queries;

/// <summary>One cell with one version of its setup shown.</summary>
/// <param name="Setups">Newest first.</param>
/// <param name="Shown">Null before the first setup.</param>
public sealed record CellDetails(
    Guid Id, string Name, Guid PlantId, string Plant, string PlantTimeZone, DateTimeOffset? RetiredAt, IReadOnlyList<VersionLine> Setups,
    CellDetails.Setup? Shown, IReadOnlyList<CellDetails.Program> Programs, bool MayEdit)
{
    /// <param name="Json">The setup's document.</param>
    /// <param name="ArmJson">The document of the arm version it carries.</param>
    public sealed record Setup(
        VersionLine Version, string Json, Guid ArmVersionId, Guid ArmId, string Arm, int ArmVersion, int NewestArmVersion, string ArmJson);

    public sealed record Program(Guid Id, string Name, string Tool, string WorkFrame);
}
