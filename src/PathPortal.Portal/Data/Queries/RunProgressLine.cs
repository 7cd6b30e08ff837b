using PathPortal.Portal.Domain.Runs;

namespace PathPortal.Portal.Data.Queries;

/// <summary>How far a run is.</summary>
/// <param name="Progress">0..1.</param>
public sealed record RunProgressLine(Guid RunId, RunState State, double Progress, int Attempts, string? Error)
{
    public bool IsUnderWay => State is RunState.Queued or RunState.Running;
}
