using System.Collections.Immutable;
using System.Globalization;

namespace PathPortal.Engine.Verdicts;

/// <summary>
/// A verdict, an outcome or a finding in one plain sentence: "At 62 % of the path (14.320 s, towards waypoint 12) joint 4 needs 131 % of its allowed
/// speed." Joints and waypoints count from 1; degrees and millimetres.
/// </summary>
public static class VerdictSentence
{
    /// <summary>What decides the verdict: the worst failure, what could not be judged, or the tightest criterion of a pass.</summary>
    public static string Of(Verdict verdict, ImmutableArray<CriterionOutcome> outcomes)
    {
        var binding = outcomes.Where(o => o.Binding).ToList();
        if (verdict == Verdict.NotAssessable)
        {
            return binding.FirstOrDefault(o => o.Status == CriterionStatus.NotAssessable) is { } open
                ? Of(open)
                : "The run could not be judged.";
        }

        var worst = verdict == Verdict.Fail
            ? binding.Where(o => o.Status == CriterionStatus.Fail).MaxBy(o => o.WorstUse ?? double.PositiveInfinity)
            : binding.Where(o => o.WorstUse is not null).MaxBy(o => o.WorstUse);
        return worst is null ? "Every criterion holds." : Of(worst);
    }

    /// <summary>One outcome in a sentence.</summary>
    public static string Of(CriterionOutcome outcome)
    {
        ArgumentNullException.ThrowIfNull(outcome);
        if (outcome.WorstUse is not { } use || outcome.Status == CriterionStatus.NotAssessable || outcome.Place is not { } place)
        {
            return outcome.Status switch
            {
                CriterionStatus.Pass => $"{Capital(CriterionName(outcome.Criterion))}: yes.",
                CriterionStatus.NotAsked => $"{Capital(CriterionName(outcome.Criterion))} is not asked for.",
                _ => outcome.Reason ?? $"{Capital(CriterionName(outcome.Criterion))} could not be judged.",
            };
        }

        return $"{At(place)} {What(outcome, use)}.";
    }

    /// <summary>One finding in a sentence.</summary>
    public static string Of(Finding finding)
    {
        ArgumentNullException.ThrowIfNull(finding);
        var subject = finding.Joint is { } joint ? $"{CriterionName(finding.Criterion)} of joint {joint + 1}" : CriterionName(finding.Criterion);
        var stretch = finding.From.Sample == finding.To.Sample
            ? Invariant($"at {finding.From.Time:0.000} s")
            : Invariant($"from {finding.From.Time:0.000} s to {finding.To.Time:0.000} s");
        return $"{At(finding.Worst)} {subject} reaches {Percent(finding.WorstUse)} of its limit; it is {(finding.Over ? "near or over" : "near")} "
            + $"the limit {stretch}.";
    }

    /// <summary>A use in percent; what fails never reads 100 %, what passes never more.</summary>
    public static string Percent(double use)
    {
        if (!(use <= 9.99))
        {
            return "more than 999 %";
        }

        var percent = use * 100;
        if (UseRules.Passes(use))
        {
            return Invariant($"{Math.Min(100, Math.Round(percent)):0} %");
        }

        return percent >= 101 ? Invariant($"{Math.Round(percent):0} %")
            : percent >= 100.001 ? Invariant($"{Math.Ceiling(percent * 1000) / 1000:0.###} %")
            : "just over 100 %";
    }

    private static string At(Place place) =>
        Invariant($"At {Math.Floor(place.PathFraction * 100):0} % of the path ({place.Time:0.000} s, towards waypoint {place.Waypoint + 1})");

    private static string What(CriterionOutcome outcome, double use)
    {
        var joint = outcome.Joint is { } index ? $"joint {index + 1}" : "a joint";
        var value = Show(outcome.Value, outcome.Unit);
        var limit = Show(outcome.LimitValue, outcome.Unit);
        return outcome.Criterion switch
        {
            _ when outcome.Value is null => $"{CriterionName(outcome.Criterion)} is not a finite number",
            Criterion.AcrossPath => $"the tool is {value} beside the path, {Percent(use)} of what is allowed",
            Criterion.StandOff => $"the tool is {value} off along its axis, {Percent(use)} of what is allowed",
            Criterion.ToolAxis => $"the tool axis is {value} off its direction, {Percent(use)} of what is allowed",
            Criterion.Tracking => $"the tool is {value} from where it should be at that moment, {Percent(use)} of what is allowed",
            Criterion.JointPosition when outcome.Value <= 0 => $"{joint} passes its position limit",
            Criterion.JointPosition when IsTurns(outcome, use) => $"{joint} is {value} from zero, {limit} are allowed",
            Criterion.JointPosition => $"{joint} is {value} from a position limit, {limit} are required",
            Criterion.JointSpeed => $"{joint} needs {Percent(use)} of its allowed speed",
            Criterion.JointAcceleration => $"{joint} needs {Percent(use)} of its allowed acceleration",
            Criterion.Singularity => $"the arm is nearest to a singularity: σ_min {value}, required {limit}",
            Criterion.ToolSpeed => $"the tool is {value} off its speed, {Percent(use)} of what is allowed",
            _ => $"{CriterionName(outcome.Criterion)} reaches {Percent(use)} of its limit",
        };
    }

    // A clearance has use required / actual, the turns of a joint without end used / allowed.
    private static bool IsTurns(CriterionOutcome outcome, double use) =>
        Math.Abs(use * outcome.LimitValue!.Value - outcome.Value!.Value) < Math.Abs(use * outcome.Value.Value - outcome.LimitValue.Value);

    private static string CriterionName(Criterion criterion) => criterion switch
    {
        Criterion.AcrossPath => "deviation across the path",
        Criterion.StandOff => "stand-off",
        Criterion.ToolAxis => "tool axis angle",
        Criterion.Tracking => "tracking error",
        Criterion.JointPosition => "position",
        Criterion.JointSpeed => "speed",
        Criterion.JointAcceleration => "acceleration",
        Criterion.Singularity => "nearness to a singularity",
        Criterion.ToolSpeed => "tool speed",
        Criterion.Finished => "path finished",
        Criterion.Reachable => "every pose reachable",
        Criterion.StartInside => "start inside the joint limits",
        Criterion.LoopSound => "loop sound",
        _ => criterion.ToString(),
    };

    private static string Show(double? value, string? unit) => (value, unit) switch
    {
        (null, _) => "",
        ({ } v, "rad") => Invariant($"{v * (180 / Math.PI):0.##}°"),
        ({ } v, "m") => Invariant($"{v * 1000:0.###} mm"),
        ({ } v, "m/s") => Invariant($"{v * 1000:0.#} mm/s"),
        ({ } v, _) => Invariant($"{v:0.####}"),
    };

    private static string Capital(string text) => char.ToUpperInvariant(text[0]) + text[1..];

    private static string Invariant(FormattableString text) => text.ToString(CultureInfo.InvariantCulture);
}
