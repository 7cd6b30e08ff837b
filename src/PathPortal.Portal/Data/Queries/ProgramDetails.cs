using PathPortal.Engine.Verdicts;
using PathPortal.Portal.Domain.Reviews;
using PathPortal.Portal.Domain.Runs;

namespace PathPortal.Portal.Data.Queries;

/// <summary>A program with its revisions, the cells it runs on, and a figure for every pair, as far as the reader's plants go.</summary>
public sealed record ProgramDetails(
    Guid Id, string Name, string Process, Guid PlantId, string PlantName, string PlantTimeZone, string Part, Guid CriteriaSheetId, string CriteriaSheet,
    IReadOnlyList<ProgramDetails.RevisionLine> Revisions, IReadOnlyList<ProgramDetails.AssignmentLine> Assignments,
    IReadOnlyList<ProgramDetails.Figure> Figures, IReadOnlyList<ProgramDetails.File> Files,
    bool MayUpload, bool MayEdit, DateTimeOffset? WorkerLastSeen)
{
    /// <summary>Newest first.</summary>
    public sealed record RevisionLine(
        Guid Id, int Number, string FileName, string Format, string Sha256, int SourceSize, int PointCount, double Length, double? PlannedTime,
        double[] BoxLow, double[] BoxHigh, string[] Remarks, string Note, string UploadedBy, DateTimeOffset UploadedAt);

    public sealed record AssignmentLine(
        Guid Id, Guid CellId, string Cell, Guid PlantId, string Plant, string ToolName, string WorkFrameName, bool FixedStart, double? FreeTurn,
        DateTimeOffset? RetiredAt, bool MayAttach, bool MaySubmit);

    public sealed record Figure(
        Guid RevisionId, Guid AssignmentId, Guid? RequestId, Guid? RunId, string? Problem, RunState? State, double Progress, Verdict? Verdict,
        double? WorstUse, Criterion? WorstCriterion, double? CycleTime, Guid? ReviewId, ReviewState? ReviewState)
    {
        public bool IsUnderWay => State is RunState.Queued or RunState.Running;
    }

    /// <summary>The newest controller file of a revision on a cell.</summary>
    public sealed record File(Guid Id, Guid RevisionId, Guid CellId, string FileName, int Size, string Sha256, string AttachedBy, DateTimeOffset AttachedAt);
}
