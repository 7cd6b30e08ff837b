using System.Collections.Immutable;
using PathPortal.Engine.Verdicts;

namespace PathPortal.Engine;

/// <summary>What a run concluded, without its samples. Small, immutable, meant to be stored.</summary>
public sealed record RunSummary
{
    public required int NumericsVersion { get; init; }

    public required Verdict Verdict { get; init; }

    /// <summary>Outcome of every criterion, in the order of <see cref="Criterion"/>.</summary>
    public required ImmutableArray<CriterionOutcome> Outcomes { get; init; }

    /// <summary>Stretches near or over a limit, worst first.</summary>
    public required ImmutableArray<Finding> Findings { get; init; }

    /// <summary>Every start posture tried; exactly one is chosen unless none could be.</summary>
    public required ImmutableArray<PostureOutcome> Postures { get; init; }

    /// <summary>Why this start posture, in a sentence.</summary>
    public required string PostureChoice { get; init; }

    /// <summary>Number of samples, k = 0..N inclusive.</summary>
    public required int SampleCount { get; init; }

    /// <summary>Control period (s).</summary>
    public required double Period { get; init; }

    /// <summary>Time from first to last sample (s).</summary>
    public required double CycleTime { get; init; }

    /// <summary>Time the reference alone needs (s); the difference is what limits and lag cost.</summary>
    public required double PlannedTime { get; init; }

    /// <summary>Programmed tool travel (m), joint moves by what the arm makes of them.</summary>
    public required double PathLength { get; init; }

    /// <summary>Characteristic length behind every singular value (m).</summary>
    public required double CharacteristicLength { get; init; }

    /// <summary>Extremes worth showing, SI.</summary>
    public required RunExtremes Extremes { get; init; }

    /// <summary>What a reader should know about how the result came about; never empty strings.</summary>
    public required ImmutableArray<string> Remarks { get; init; }
}
