using PathPortal.Engine.Verdicts;
using PathPortal.Portal.Domain.Reviews;
using PathPortal.Portal.Domain.Runs;

namespace PathPortal.Portal.Data.Queries;

/// <summary>How the newest revision of a program stands on one cell.</summary>
/// <param name="Problem">Why there is no run, when there is none.</param>
/// <param name="WorstUse">1 = at the limit; null until there is a result, or where nothing could be judged.</param>
/// <param name="Progress">0..1 of a run under way.</param>
public sealed record FleetFigure(
    Guid ProgramId, Guid CellId, Guid AssignmentId, Guid RevisionId, int RevisionNumber, Guid? RunId, string? Problem, RunState? RunState,
    double Progress, Verdict? Verdict, double? WorstUse, Criterion? WorstCriterion, Guid? ReviewId, ReviewState? ReviewState)
{
    /// <summary>Sorts worst first: what fails or could not be computed, then by use; what is not yet known last.</summary>
    public double Weight => this switch
    {
        { Problem: not null } or { RunState: Domain.Runs.RunState.Failed } => double.PositiveInfinity,
        { Verdict: Engine.Verdicts.Verdict.Fail } => 1e6 + Math.Min(WorstUse ?? 1e6, 1e6),
        { Verdict: Engine.Verdicts.Verdict.NotAssessable } => 1e5,
        { Verdict: Engine.Verdicts.Verdict.Pass } => WorstUse ?? 0,
        _ => -1,
    };
}
