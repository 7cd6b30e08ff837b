using System.Globalization;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Measures;

namespace PathPortal.Engine.Verdicts;

/// <summary>The outcome of yes-or-no criteria, and of criteria that were not asked for or have no samples to judge by.</summary>
internal static class AnswerOutcome
{
    public static CriterionOutcome Of(Scenario scenario, Criterion criterion, RunFacts facts, double[]? start)
    {
        var (answer, reason) = criterion switch
        {
            Criterion.Finished => (facts.Finished, facts.NotFinishedReason),
            Criterion.Reachable => (facts.Reachable, facts.NotReachableReason),
            Criterion.LoopSound => (facts.LoopSound, facts.NotSoundReason),
            Criterion.StartInside => StartInside(scenario.Arm, start),
            _ => (null, "The run has no samples."),
        };
        var status = answer switch
        {
            true => CriterionStatus.Pass,
            false => CriterionStatus.Fail,
            null when !LimitMeasures.IsAsked(scenario.Criteria, scenario.Path, criterion) => CriterionStatus.NotAsked,
            null => CriterionStatus.NotAssessable,
        };
        return new()
        {
            Criterion = criterion,
            Status = status,
            Binding = Judgement.Binds(scenario.Criteria, criterion),
            NearThreshold = Judgement.NearOf(scenario.Criteria, criterion),
            Reason = status is CriterionStatus.Fail or CriterionStatus.NotAssessable ? reason ?? "It could not be judged." : null,
        };
    }

    private static (bool? Answer, string? Reason) StartInside(ArmModel arm, double[]? start)
    {
        if (start is null)
        {
            return (null, "There is no start posture.");
        }

        for (var i = 0; i < start.Length; i++)
        {
            var joint = arm.Joints[i];
            var (low, high) = (joint.Limits.Low?.Value ?? double.NegativeInfinity, joint.Limits.High?.Value ?? double.PositiveInfinity);
            if (!(start[i] >= low && start[i] <= high) || !double.IsFinite(start[i]))
            {
                return (false, $"Joint {i + 1} starts at {Show(joint, start[i])}, outside {Range(joint, low, high)}.");
            }
        }

        return (true, null);
    }

    private static string Range(Joint joint, double low, double high) =>
        double.IsInfinity(low) ? $"its range up to {Show(joint, high)}"
        : double.IsInfinity(high) ? $"its range from {Show(joint, low)}"
        : $"its range from {Show(joint, low)} to {Show(joint, high)}";

    private static string Show(Joint joint, double value) => joint.Kind == JointKind.Revolute
        ? string.Create(CultureInfo.InvariantCulture, $"{value * (180 / Math.PI):0.###}°")
        : string.Create(CultureInfo.InvariantCulture, $"{value * 1000:0.###} mm");
}
