namespace PathPortal.Portal.Domain.Programs;

/// <summary>One uploaded path. Its bytes and digest never change; a change is a new revision.</summary>
public sealed class Revision
{
    internal Revision(Guid programId, int number, RevisionSource source, RevisionFacts facts, string note, Guid by, DateTimeOffset at)
    {
        Id = Guid.CreateVersion7(at);
        ProgramId = programId;
        Number = number;
        FileName = source.FileName;
        Format = source.Format;
        Source = source.Bytes;
        Sha256 = Sha256Text.Of(source.Bytes);
        SourceSize = source.Bytes.Length;
        PointCount = facts.PointCount;
        Length = facts.Length;
        PlannedTime = facts.PlannedTime;
        BoxLow = facts.BoxLow;
        BoxHigh = facts.BoxHigh;
        Remarks = [.. facts.Remarks];
        Note = note;
        UploadedBy = by;
        UploadedAt = at;
    }

    private Revision()
    {
    }

    public Guid Id { get; private set; }

    public Guid ProgramId { get; private set; }

    /// <summary>From 1.</summary>
    public int Number { get; private set; }

    public string FileName { get; private set; } = "";

    /// <summary>Name of the reader that understood the file, such as "csv".</summary>
    public string Format { get; private set; } = "";

    /// <summary>The file as it came. Large: lists must not select it.</summary>
    public byte[] Source { get; private set; } = [];

    public string Sha256 { get; private set; } = "";

    public int SourceSize { get; private set; }

    public int PointCount { get; private set; }

    /// <summary>Programmed tool travel (m).</summary>
    public double Length { get; private set; }

    /// <summary>Time the path needs on its own (s), where the reader could tell; a cell may need longer.</summary>
    public double? PlannedTime { get; private set; }

    /// <summary>Smallest x, y, z of the points in the work frame (m).</summary>
    public double[] BoxLow { get; private set; } = [];

    /// <summary>Largest x, y, z of the points in the work frame (m).</summary>
    public double[] BoxHigh { get; private set; } = [];

    /// <summary>What the reader remarked.</summary>
    public string[] Remarks { get; private set; } = [];

    public string Note { get; private set; } = "";

    public Guid UploadedBy { get; private set; }

    public DateTimeOffset UploadedAt { get; private set; }
}
