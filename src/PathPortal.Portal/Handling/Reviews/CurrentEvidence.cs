using PathPortal.Engine.Verdicts;
using PathPortal.Portal.Domain.Reviews;
using PathPortal.Portal.Domain.Runs;

namespace PathPortal.Portal.Handling.Reviews;

/// <summary>What a review rests on at this moment.</summary>
/// <param name="RunRequestId">The newest request for the revision on the assignment; null when none was ever made.</param>
/// <param name="Digests">Null while there is no run to bind to.</param>
/// <param name="StaleBecause">What changed since the run was asked for: "the cell's setup", "the criteria"; null when nothing did.</param>
/// <param name="Problem">Why nothing can be simulated; null when it can.</param>
public sealed record CurrentEvidence(
    Guid? RunRequestId, Guid? RunId, RunState? RunState, Verdict? Verdict, Evidence? Digests, string? StaleBecause, string? Problem)
{
    /// <summary>Null when there is a finished run on what is in force now; else why there is not, in a sentence.</summary>
    public string? NotUsable => this switch
    {
        { RunRequestId: null } => "The revision was never simulated on this cell.",
        { Problem: { } problem } => "The revision can't be simulated on this cell: " + problem,
        { StaleBecause: { } what } => $"Since the run {what} changed; the revision has to be simulated again first.",
        { RunState: Domain.Runs.RunState.Failed } => "The simulation failed; it has to be run again first.",
        { RunState: not Domain.Runs.RunState.Done } => "The simulation is not finished yet.",
        _ => null,
    };
}
