namespace PathPortal.Portal.Domain.Programs;

/// <summary>A path program of a part. Its content stands in revisions; the plant it belongs to is where revisions are uploaded.</summary>
public sealed class PathProgram
{
    public PathProgram(Guid plantId, Guid partId, string name, string process, Guid criteriaSheetId, Guid by, DateTimeOffset at)
    {
        Id = Guid.CreateVersion7(at);
        PlantId = plantId;
        PartId = partId;
        Name = name;
        Process = process;
        CriteriaSheetId = criteriaSheetId;
        CreatedBy = by;
        CreatedAt = at;
    }

    private PathProgram()
    {
    }

    public Guid Id { get; private set; }

    /// <summary>Whose authors upload revisions. Other plants assign the program to cells of theirs.</summary>
    public Guid PlantId { get; private set; }

    public Guid PartId { get; private set; }

    public string Name { get; private set; } = "";

    /// <summary>What the tool does, in a word or two: sealing, deburring…</summary>
    public string Process { get; private set; } = "";

    /// <summary>The sheet whose newest version new runs are judged by.</summary>
    public Guid CriteriaSheetId { get; private set; }

    public Guid CreatedBy { get; private set; }

    public DateTimeOffset CreatedAt { get; private set; }

    public DateTimeOffset? RetiredAt { get; private set; }

    /// <summary>Number of the newest revision; 0 before the first.</summary>
    public int LatestNumber { get; private set; }

    public uint Version { get; private set; }

    public Revision AddRevision(RevisionSource source, RevisionFacts facts, string note, Guid by, DateTimeOffset at) =>
        new(Id, ++LatestNumber, source, facts, note, by, at);

    public void Retire(DateTimeOffset at) => RetiredAt ??= at;
}
