using PathPortal.Engine.Geometry;

namespace PathPortal.Engine.Paths;

/// <summary>One programmed straight segment as written, corners not rounded: position at a steady pace, orientation by SLERP. Work frame. Immutable.</summary>
internal sealed class Segment
{
    /// <summary>Shorter than this (m) two points are one: a thousandth of a micrometre.</summary>
    public const double PointLength = 1e-9;

    /// <summary>Less than this (rad) two orientations are one.</summary>
    public const double PointAngle = 1e-9;

    private readonly Slerp slerp;
    private readonly UnitQuaternion startOrientation;

    public Segment(Waypoint from, Waypoint to, int waypoint, double startTravel)
    {
        (Start, End, startOrientation, EndOrientation, Waypoint) = (from.Position, to.Position, from.Orientation, to.Orientation, waypoint);
        Speed = to.Speed;
        var way = End - Start;
        Length = way.Norm <= PointLength ? 0 : way.Norm;
        Direction = Length > 0 ? 1 / Length * way : Vector3D.Zero;
        slerp = Slerp.Between(from.Orientation, to.Orientation);
        StartTravel = startTravel;
    }

    /// <summary>Index of the waypoint the segment ends at.</summary>
    public int Waypoint { get; }

    public Vector3D Start { get; }

    public Vector3D End { get; }

    public UnitQuaternion EndOrientation { get; }

    /// <summary>Unit vector from start to end; zero where both are one point.</summary>
    public Vector3D Direction { get; }

    /// <summary>Length (m); exactly zero where both ends are one point.</summary>
    public double Length { get; }

    /// <summary>Programmed speed (m/s).</summary>
    public double Speed { get; }

    /// <summary>The whole turn as a rotation vector in axes of W (rad).</summary>
    public Vector3D Turn => TurnAngle > 0 ? slerp.Turn : Vector3D.Zero;

    public double TurnAngle => slerp.Angle <= PointAngle ? 0 : slerp.Angle;

    /// <summary>Turn per length (rad/m).</summary>
    public double TurnPerLength => TurnAngle / Length;

    /// <summary>Programmed travel from the path's begin to the segment's (m).</summary>
    public double StartTravel { get; }

    public double EndTravel => StartTravel + Length;

    /// <summary>R_WT after a share 0..1 of the segment.</summary>
    public UnitQuaternion OrientationAt(double share) => TurnAngle > 0 ? slerp.At(share) : startOrientation;

    /// <summary>The place at a distance 0..<see cref="Length"/> from the start, for a segment longer than a point.</summary>
    public PathPoint At(double distance) => new(
        Start + distance * Direction,
        OrientationAt(distance / Length),
        Direction,
        1 / Length * Turn,
        Waypoint,
        StartTravel + distance);
}
