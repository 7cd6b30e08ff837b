using PathPortal.Engine.Verdicts;

namespace PathPortal.Engine;

/// <summary>Largest and smallest values over a run with their places; SI. A place is null when the run has no such sample.</summary>
public sealed record RunExtremes
{
    /// <summary>Largest tracking error at equal times (m).</summary>
    public double MaxTrackingError { get; init; }

    public Place? MaxTrackingErrorPlace { get; init; }

    /// <summary>Root mean square tracking error (m).</summary>
    public double RmsTrackingError { get; init; }

    /// <summary>Largest orientation error at equal times (rad).</summary>
    public double MaxTurnError { get; init; }

    public Place? MaxTurnErrorPlace { get; init; }

    /// <summary>Largest deviation from the programmed geometry in process sections (m).</summary>
    public double? MaxDeviation { get; init; }

    public Place? MaxDeviationPlace { get; init; }

    /// <summary>Smallest σ_min of the scaled Jacobian on tool-space moves.</summary>
    public double? MinSigma { get; init; }

    public Place? MinSigmaPlace { get; init; }

    /// <summary>Largest condition number σ_max/σ_min.</summary>
    public double? MaxCondition { get; init; }

    /// <summary>Largest tool speed (m/s).</summary>
    public double MaxToolSpeed { get; init; }

    /// <summary>Largest joint speed demand before limiting over all revolute joints (rad/s).</summary>
    public double MaxJointSpeedDemand { get; init; }
}
