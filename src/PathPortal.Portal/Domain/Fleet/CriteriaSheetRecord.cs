namespace PathPortal.Portal.Domain.Fleet;

/// <summary>A criteria sheet under its name; what it demands stands in its versions. Shared by the company.</summary>
public sealed class CriteriaSheetRecord
{
    public CriteriaSheetRecord(string name, DateTimeOffset at)
    {
        Id = Guid.CreateVersion7(at);
        Name = name;
        CreatedAt = at;
    }

    private CriteriaSheetRecord()
    {
    }

    public Guid Id { get; private set; }

    public string Name { get; private set; } = "";

    public DateTimeOffset CreatedAt { get; private set; }

    public DateTimeOffset? RetiredAt { get; private set; }

    /// <summary>Number of the newest version; 0 before the first.</summary>
    public int LatestNumber { get; private set; }

    public uint Version { get; private set; }

    public CriteriaSheetVersion AddVersion(StoredDocument document, string note, Guid by, DateTimeOffset at) =>
        new(Id, ++LatestNumber, document, note, by, at);

    public void Rename(string name) => Name = name;

    public void Retire(DateTimeOffset at) => RetiredAt ??= at;
}
