using PathPortal.Engine.Verdicts;

namespace PathPortal.Engine;

/// <summary>
/// Every sample of one run as columns of equal length <see cref="Count"/>, SI. Poses are in the work frame W. Joint columns are indexed
/// [joint][sample]. Recomputed on demand, never stored except with a decision. The arrays are the run's own: read them, don't write them.
/// </summary>
public sealed record RunSamples
{
    private IReadOnlyDictionary<Criterion, double[]> use = new Dictionary<Criterion, double[]>();

    public required int Count { get; init; }

    public required int JointCount { get; init; }

    /// <summary>Control period (s); sample k is at k times this.</summary>
    public required double Period { get; init; }

    /// <summary>Time of the reference (s); falls behind the clock where the controller slows the path.</summary>
    public required double[] ReferenceTime { get; init; }

    /// <summary>Share of the programmed tool travel passed, 0..1, never falling.</summary>
    public required double[] PathFraction { get; init; }

    /// <summary>Waypoint (from 0) the reference is on its way to.</summary>
    public required int[] Waypoint { get; init; }

    /// <summary>True in process sections after their lead-in.</summary>
    public required bool[] Process { get; init; }

    /// <summary>Joint values (rad or m).</summary>
    public required double[][] Joints { get; init; }

    /// <summary>Joint speeds (rad/s or m/s).</summary>
    public required double[][] JointSpeeds { get; init; }

    /// <summary>Joint speeds the loop asked for before any limit (rad/s or m/s).</summary>
    public required double[][] JointSpeedDemands { get; init; }

    /// <summary>Joint accelerations the loop asked for before any limit (rad/s² or m/s²).</summary>
    public required double[][] JointAccelerationDemands { get; init; }

    /// <summary>Reference tool centre point (m), [axis][sample].</summary>
    public required double[][] ReferencePosition { get; init; }

    /// <summary>Reference orientation, [w, x, y, z][sample].</summary>
    public required double[][] ReferenceOrientation { get; init; }

    /// <summary>True tool centre point (m), [axis][sample].</summary>
    public required double[][] ToolPosition { get; init; }

    /// <summary>True tool orientation, [w, x, y, z][sample].</summary>
    public required double[][] ToolOrientation { get; init; }

    /// <summary>Distance between reference and tool at equal times (m).</summary>
    public required double[] TrackingError { get; init; }

    /// <summary>Angle of the orientation error at equal times, in the constrained directions (rad).</summary>
    public required double[] TurnError { get; init; }

    /// <summary>Distance from the programmed geometry across the path (m); NaN outside process sections.</summary>
    public required double[] AcrossPath { get; init; }

    /// <summary>Distance from the programmed geometry along the tool axis (m, absolute); NaN outside process sections.</summary>
    public required double[] StandOff { get; init; }

    /// <summary>Angle between programmed and true tool axis (rad); NaN outside process sections.</summary>
    public required double[] ToolAxisAngle { get; init; }

    /// <summary>Speed of the tool centre point relative to the part (m/s).</summary>
    public required double[] ToolSpeed { get; init; }

    /// <summary>Speed of the reference at that moment (m/s).</summary>
    public required double[] ReferenceSpeed { get; init; }

    /// <summary>Smallest singular value of the scaled Jacobian.</summary>
    public required double[] SigmaMin { get; init; }

    /// <summary>Largest singular value of the scaled Jacobian.</summary>
    public required double[] SigmaMax { get; init; }

    /// <summary>λ² in effect.</summary>
    public required double[] DampingSquared { get; init; }

    /// <summary>Common factor the speed limiter applied, 0..1.</summary>
    public required double[] SpeedScale { get; init; }

    /// <summary>Rate of the reference clock, 0..1.</summary>
    public required double[] PathScale { get; init; }

    /// <summary>Use of the limit per sample for every criterion that has one; NaN where it does not apply, +∞ as in <see cref="CriterionOutcome.WorstUse"/>.</summary>
    public IReadOnlyDictionary<Criterion, double[]> Use { get => use; init => use = value; }

    /// <summary>Fills <see cref="Use"/>, once, when the run is judged.</summary>
    internal void Measured(IReadOnlyDictionary<Criterion, double[]> measured) => use = measured;
}
