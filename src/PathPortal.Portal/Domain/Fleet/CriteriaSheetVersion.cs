namespace PathPortal.Portal.Domain.Fleet;

/// <summary>One version of a criteria sheet: tolerances, shares and allowances. Never changes.</summary>
public sealed class CriteriaSheetVersion
{
    internal CriteriaSheetVersion(Guid criteriaSheetId, int number, StoredDocument document, string note, Guid by, DateTimeOffset at)
    {
        Id = Guid.CreateVersion7(at);
        CriteriaSheetId = criteriaSheetId;
        Number = number;
        Json = document.Json;
        Sha256 = document.Sha256;
        Note = note;
        CreatedBy = by;
        CreatedAt = at;
    }

    private CriteriaSheetVersion()
    {
    }

    public Guid Id { get; private set; }

    public Guid CriteriaSheetId { get; private set; }

    /// <summary>From 1.</summary>
    public int Number { get; private set; }

    public string Json { get; private set; } = "";

    public string Sha256 { get; private set; } = "";

    public string Note { get; private set; } = "";

    public Guid CreatedBy { get; private set; }

    public DateTimeOffset CreatedAt { get; private set; }
}
