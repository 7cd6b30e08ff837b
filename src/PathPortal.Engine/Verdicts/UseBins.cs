using System.Collections.Immutable;

namespace PathPortal.Engine.Verdicts;

/// <summary>
/// Limit use along the run in at most 512 bins of consecutive samples; each bin keeps its worst sample, so no peak is ever lost.
/// </summary>
public sealed record UseBins
{
    public const int MaxBins = 512;

    /// <summary>The criteria of the rows, in order.</summary>
    public required ImmutableArray<Criterion> Criteria { get; init; }

    /// <summary>First sample of each bin, and one past the last sample at the end: length bins + 1.</summary>
    public required ImmutableArray<int> Edges { get; init; }

    /// <summary>Worst use, criteria × bins, row-major. NaN where the criterion applies to no sample of the bin; +∞ as in <see cref="CriterionOutcome.WorstUse"/>.</summary>
    public required ImmutableArray<float> WorstUse { get; init; }

    /// <summary>Sample of the worst use, criteria × bins, row-major; −1 where absent.</summary>
    public required ImmutableArray<int> WorstSample { get; init; }

    public int BinCount => Edges.Length - 1;
}
