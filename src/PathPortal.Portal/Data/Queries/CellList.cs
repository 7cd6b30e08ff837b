namespace PathPortal.Portal.Data.Queries;

/// <summary>The cells the reader may see, those in use first.</summary>
/// <param name="MayAddIn">Plants in which the reader may add a cell.</param>
public sealed record CellList(IReadOnlyList<CellList.Line> Cells, IReadOnlyList<CellList.Plant> MayAddIn)
{
    /// <param name="ArmVersion">Version of the arm in the newest setup, and the newest there is.</param>
    public sealed record Line(
        Guid Id, string Name, string PlantName, string PlantTimeZone, DateTimeOffset? RetiredAt, int SetupNumber, DateTimeOffset? SetupAt,
        Guid? ArmId, string? Arm, int? ArmVersion, int? NewestArmVersion, int Programs);

    public sealed record Plant(Guid Id, string Name);
}
