namespace PathPortal.Portal.Domain.Programs;

/// <summary>A program on a cell. At most one of a pair is in force; a change of terms retires it and makes another.</summary>
public sealed class Assignment
{
    public Assignment(Guid programId, Guid cellId, StartTerms terms, Guid by, DateTimeOffset at)
    {
        Id = Guid.CreateVersion7(at);
        ProgramId = programId;
        CellId = cellId;
        ToolName = terms.ToolName;
        WorkFrameName = terms.WorkFrameName;
        StartJoints = terms.StartJoints;
        FreeTurn = terms.FreeTurn;
        CreatedBy = by;
        CreatedAt = at;
    }

    private Assignment()
    {
    }

    public Guid Id { get; private set; }

    public Guid ProgramId { get; private set; }

    public Guid CellId { get; private set; }

    public string ToolName { get; private set; } = "";

    public string WorkFrameName { get; private set; } = "";

    /// <summary>Joint values at the first point (rad or m); null: every posture is tried and the best one chosen.</summary>
    public double[]? StartJoints { get; private set; }

    /// <summary>Turn about the free tool axis at the first point (rad); null: a grid is tried.</summary>
    public double? FreeTurn { get; private set; }

    public Guid CreatedBy { get; private set; }

    public DateTimeOffset CreatedAt { get; private set; }

    public DateTimeOffset? RetiredAt { get; private set; }

    public uint Version { get; private set; }

    public StartTerms Terms => new(ToolName, WorkFrameName, StartJoints, FreeTurn);

    public void Retire(DateTimeOffset at) => RetiredAt ??= at;
}
