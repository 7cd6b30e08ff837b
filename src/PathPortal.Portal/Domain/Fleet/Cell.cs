namespace PathPortal.Portal.Domain.Fleet;

/// <summary>A robot cell of a plant; how it is built stands in its setups.</summary>
public sealed class Cell
{
    public Cell(Guid plantId, string name, DateTimeOffset at)
    {
        Id = Guid.CreateVersion7(at);
        PlantId = plantId;
        Name = name;
        CreatedAt = at;
    }

    private Cell()
    {
    }

    public Guid Id { get; private set; }

    public Guid PlantId { get; private set; }

    public string Name { get; private set; } = "";

    public DateTimeOffset CreatedAt { get; private set; }

    public DateTimeOffset? RetiredAt { get; private set; }

    /// <summary>Number of the newest setup; 0 before the first.</summary>
    public int LatestSetupNumber { get; private set; }

    public uint Version { get; private set; }

    public CellSetup AddSetup(Guid armModelVersionId, StoredDocument document, string note, Guid by, DateTimeOffset at) =>
        new(Id, ++LatestSetupNumber, armModelVersionId, document, note, by, at);

    public void Rename(string name) => Name = name;

    public void Retire(DateTimeOffset at) => RetiredAt ??= at;
}
