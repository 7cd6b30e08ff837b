using PathPortal.Portal.Domain.Reviews;
using PathPortal.Portal.Handling.Reviews;

namespace PathPortal.Portal.Data.Queries;

/// <summary>One review with everything a decision rests on, as it is now.</summary>
/// <param name="SummaryJson">The run's summary; null until it is done.</param>
/// <param name="MayDecideNot">Why this reader may not decide; null when they may.</param>
public sealed record ReviewDetails(
    Guid Id, ReviewState State, int Round, int ApprovalsRequired, int ApprovalsGiven, ReviewDetails.Subject About, CurrentEvidence Evidence,
    string? SummaryJson, ReviewDetails.ControllerFile? File, IReadOnlyList<ReviewDetails.Move> Steps, IReadOnlyList<ReviewDetails.Signature> Decisions,
    string? MayDecideNot, bool MaySubmit, bool MayWithdraw)
{
    public sealed record Subject(
        Guid ProgramId, string Program, string Process, string Part, Guid RevisionId, int RevisionNumber, string RevisionNote, string UploadedBy,
        DateTimeOffset UploadedAt, Guid AssignmentId, Guid CellId, string Cell, Guid PlantId, string Plant, string TimeZone, string ToolName,
        string WorkFrameName, int? SetupNumber, string? Arm, int? ArmNumber, Guid? CriteriaSheetId, string? CriteriaSheet, int? CriteriaNumber);

    public sealed record ControllerFile(Guid Id, string FileName, string Sha256, DateTimeOffset AttachedAt);

    /// <param name="By">Null when a re-check moved it.</param>
    public sealed record Move(int Number, ReviewState From, ReviewState To, string? By, string Why, DateTimeOffset At);

    public sealed record Signature(DecisionKind Kind, int Round, string By, DateTimeOffset At, string Meaning, string Reason, Evidence Evidence);
}
