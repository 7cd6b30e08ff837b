using PathPortal.Engine;
using PathPortal.Engine.Verdicts;
using PathPortal.Portal.Domain.Runs;

namespace PathPortal.Portal.Simulation;

/// <summary>From what the engine gives back to what a run's row keeps.</summary>
public static class RunConclusions
{
    public static RunConclusion Of(RunResult result)
    {
        // What a list shows: the binding criterion nearest to its limit or farthest over it. Yes-or-no criteria have no use; one that
        // fails stands for a passed hard limit, and a use that is not finite must never sort as a small one.
        var worst = result.Summary.Outcomes
            .Where(o => o.Binding && (o.WorstUse is not null || o.Status == CriterionStatus.Fail))
            .Select(o => (o.Criterion, Use: o.WorstUse is { } use && !double.IsNaN(use) ? use : double.PositiveInfinity))
            .OrderByDescending(o => o.Use)
            .Select(o => ((Criterion Criterion, double Use)?)o)
            .FirstOrDefault();
        return new(
            result.Summary.Verdict,
            worst?.Use,
            worst?.Criterion,
            result.Summary.CycleTime,
            RunSummaryJson.Write(result.Summary),
            result.Bins is { } bins ? UseBinsCodec.Pack(bins) : null);
    }
}
