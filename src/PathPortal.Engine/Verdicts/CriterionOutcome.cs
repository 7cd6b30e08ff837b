namespace PathPortal.Engine.Verdicts;

/// <summary>One criterion over one run: its worst use of the limit and where that is.</summary>
public sealed record CriterionOutcome
{
    public required Criterion Criterion { get; init; }

    public required CriterionStatus Status { get; init; }

    /// <summary>False: advice only, does not decide the verdict.</summary>
    public required bool Binding { get; init; }

    /// <summary>
    /// Largest use of the limit, 1 = exactly at it; positive infinity for a zero denominator, a passed hard limit or a value that is not
    /// finite; null for yes/no criteria and where nothing could be judged.
    /// </summary>
    public double? WorstUse { get; init; }

    /// <summary>Where the worst use is; null where there is no such place.</summary>
    public Place? Place { get; init; }

    /// <summary>Joint (from 0) the worst use belongs to, where the criterion is about joints.</summary>
    public int? Joint { get; init; }

    /// <summary>The value at the worst place and the limit it is compared with (after shares and allowances), SI.</summary>
    public double? Value { get; init; }

    public double? LimitValue { get; init; }

    /// <summary>SI unit of <see cref="Value"/>: "m", "rad", "rad/s", "m/s²", "1"…</summary>
    public string? Unit { get; init; }

    /// <summary>One sentence for yes/no criteria that fail and for what is not assessable; else null.</summary>
    public string? Reason { get; init; }

    /// <summary>Use at and above which the criterion counts as near.</summary>
    public required double NearThreshold { get; init; }
}
