using System.Collections.Immutable;
using PathPortal.Engine.Geometry;

namespace PathPortal.Engine.Paths;

/// <summary>One programmed point of a path, in the work frame W. Everything but the point itself says how it is reached from the one before.</summary>
public sealed record Waypoint
{
    /// <summary>Line of the source the point was read from, from 1; 0 when it comes from no file.</summary>
    public int SourceLine { get; init; }

    /// <summary>Free text for people; empty when none was given.</summary>
    public string Label { get; init; } = "";

    /// <summary>Tool centre point in W (m).</summary>
    public required Vector3D Position { get; init; }

    /// <summary>
    /// Tool orientation R_WT. For a source that gives only the tool axis: at the first point the shortest turn from W's z axis to it, then the
    /// shortest turn on from the point before, so that nothing spins about the axis.
    /// </summary>
    public required UnitQuaternion Orientation { get; init; }

    /// <summary>Motion of the segment that ends here. Ignored at the first waypoint.</summary>
    public required MotionKind Motion { get; init; }

    /// <summary>Directions constrained on the segment that ends here.</summary>
    public TaskKind Task { get; init; } = TaskKind.Pose;

    /// <summary>Programmed tool speed on a straight segment (m/s), above zero.</summary>
    public double Speed { get; init; }

    /// <summary>Share of the joint speed limits used on a joint segment, in (0, 1].</summary>
    public double JointSpeedShare { get; init; } = 0.5;

    /// <summary>Posture at the end of a joint segment (rad or m, controller's joint values); null: the nearest posture that reaches the pose.</summary>
    public ImmutableArray<double>? Joints { get; init; }

    /// <summary>Reach of the corner rounding at this waypoint (m): the path leaves the straight that far before the point. Zero: the tool stops here.</summary>
    public double CornerReach { get; init; }

    /// <summary>The process runs on the segment that ends here.</summary>
    public bool ProcessOn { get; init; }

    /// <summary>Where a process section begins with this segment: its first length along the path (m) that deviation and speed criteria pass over.</summary>
    public double LeadIn { get; init; }

    /// <summary>Pause after reaching the point (s); above zero only where the tool stops.</summary>
    public double Dwell { get; init; }
}
