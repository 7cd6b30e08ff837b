using System.Collections.Immutable;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Measures;

namespace PathPortal.Engine.Verdicts;

/// <summary>
/// One simulated run held against the criteria. Outcomes and verdict are there at once, for every start posture; findings, bins and extremes are made
/// when asked for, for the one that is kept.
/// </summary>
public sealed class Judgement
{
    /// <summary>A run keeps this many findings, the worst ones.</summary>
    public const int MostFindings = 64;

    private readonly Scenario scenario;
    private readonly RunSamples? samples;
    private readonly ImmutableArray<(LimitMeasure Measure, double[] Use)> columns;

    private Judgement(
        Scenario scenario,
        RunSamples? samples,
        ImmutableArray<(LimitMeasure Measure, double[] Use)> columns,
        ImmutableArray<CriterionOutcome> outcomes)
    {
        this.scenario = scenario;
        this.samples = samples;
        this.columns = columns;
        Outcomes = outcomes;
        Verdict = VerdictOf(outcomes);
        (WorstUse, WorstCriterion) = WorstOf(outcomes);
    }

    /// <summary>One outcome for every criterion, in the order of <see cref="Criterion"/>.</summary>
    public ImmutableArray<CriterionOutcome> Outcomes { get; }

    public Verdict Verdict { get; }

    /// <summary>Largest use over the binding criteria, +∞ where a yes-or-no criterion fails, 0 where nothing could be judged.</summary>
    public double WorstUse { get; }

    /// <summary>The criterion of <see cref="WorstUse"/>; null where nothing could be judged.</summary>
    public Criterion? WorstCriterion { get; }

    /// <summary>Judges a run by its samples and fills their <see cref="RunSamples.Use"/>.</summary>
    public static Judgement Of(Scenario scenario, RunSamples samples, RunFacts facts)
    {
        ArgumentNullException.ThrowIfNull(scenario);
        ArgumentNullException.ThrowIfNull(samples);
        ArgumentNullException.ThrowIfNull(facts);
        ImmutableArray<(LimitMeasure Measure, double[] Use)> columns =
            [.. LimitMeasures.For(scenario, samples).Select(m => (m, m.Column(samples.Count)))];
        samples.Measured(columns.ToDictionary(c => c.Measure.Criterion, c => c.Use));

        var start = samples.Count == 0 ? null : samples.Joints.Select(j => j[0]).ToArray();
        var outcomes = Enum.GetValues<Criterion>().Order().Select(criterion =>
            columns.FirstOrDefault(c => c.Measure.Criterion == criterion) is { Measure: not null } column
                ? UseOutcome.Of(scenario.Criteria, column.Measure, column.Use, samples)
                : AnswerOutcome.Of(scenario, criterion, facts, start));
        return new(scenario, samples, columns, [.. outcomes]);
    }

    /// <summary>Judges what could not be simulated at all; no criterion with a use is assessable.</summary>
    public static Judgement WithoutSamples(Scenario scenario, RunFacts facts)
    {
        ArgumentNullException.ThrowIfNull(scenario);
        ArgumentNullException.ThrowIfNull(facts);
        var joints = scenario.Arm.Joints.IsDefault ? 0 : scenario.Arm.Joints.Length;
        var start = scenario.Start is { IsDefault: false } given && given.Length == joints ? given.ToArray() : null;
        var outcomes = Enum.GetValues<Criterion>().Order().Select(c => AnswerOutcome.Of(scenario, c, facts, start));
        return new(scenario, null, [], [.. outcomes]);
    }

    /// <summary>Stretches near or over a limit, worst first, and how many were left out.</summary>
    public (ImmutableArray<Finding> Kept, int LeftOut) Findings()
    {
        var all = columns.SelectMany(c => FindingFinder.Find(
            c.Measure, c.Use, NearOf(scenario.Criteria, c.Measure.Criterion), Binds(scenario.Criteria, c.Measure.Criterion), samples!)).ToList();
        return ([.. FindingFinder.WorstFirst(all).Take(MostFindings)], Math.Max(0, all.Count - MostFindings));
    }

    /// <summary>Limit use in at most 512 bins; null without samples.</summary>
    public UseBins? Bins() => samples is null or { Count: 0 }
        ? null
        : UseBinning.Bin([.. columns.Select(c => (c.Measure.Criterion, c.Use))], samples.Count);

    /// <summary>Largest and smallest values; all zero or absent without samples.</summary>
    public RunExtremes Extremes() => samples is null ? new() : ExtremeValues.Of(scenario, samples);

    internal static bool Binds(CriteriaSheet criteria, Criterion criterion) => criterion != Criterion.Singularity || criteria.SingularityBinds;

    internal static double NearOf(CriteriaSheet criteria, Criterion criterion) =>
        criteria.Near.GetValueOrDefault(criterion, CriteriaSheet.DefaultNear);

    private static Verdict VerdictOf(ImmutableArray<CriterionOutcome> outcomes) =>
        outcomes.Any(o => o is { Binding: true, Status: CriterionStatus.Fail }) ? Verdict.Fail
        : outcomes.Any(o => o is { Binding: true, Status: CriterionStatus.NotAssessable }) ? Verdict.NotAssessable
        : Verdict.Pass;

    private static (double Use, Criterion? Criterion) WorstOf(ImmutableArray<CriterionOutcome> outcomes)
    {
        var (worst, criterion) = (0.0, (Criterion?)null);
        foreach (var outcome in outcomes.Where(o => o.Binding))
        {
            var use = outcome.WorstUse ?? (outcome.Status == CriterionStatus.Fail ? double.PositiveInfinity : double.NaN);
            if (!double.IsNaN(use) && (criterion is null || use > worst))
            {
                (worst, criterion) = (use, outcome.Criterion);
            }
        }

        return (worst, criterion);
    }
}
