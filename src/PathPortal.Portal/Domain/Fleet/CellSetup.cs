namespace PathPortal.Portal.Domain.Fleet;

/// <summary>One version of how a cell is set up: arm, base pose, tools, work frames, controller behaviour. Never changes.</summary>
public sealed class CellSetup
{
    internal CellSetup(
        Guid cellId, int number, Guid armModelVersionId, StoredDocument document, string note, Guid by, DateTimeOffset at)
    {
        Id = Guid.CreateVersion7(at);
        CellId = cellId;
        Number = number;
        ArmModelVersionId = armModelVersionId;
        Json = document.Json;
        Sha256 = document.Sha256;
        Note = note;
        CreatedBy = by;
        CreatedAt = at;
    }

    private CellSetup()
    {
    }

    public Guid Id { get; private set; }

    public Guid CellId { get; private set; }

    /// <summary>From 1.</summary>
    public int Number { get; private set; }

    public Guid ArmModelVersionId { get; private set; }

    public string Json { get; private set; } = "";

    public string Sha256 { get; private set; } = "";

    public string Note { get; private set; } = "";

    public Guid CreatedBy { get; private set; }

    public DateTimeOffset CreatedAt { get; private set; }
}
