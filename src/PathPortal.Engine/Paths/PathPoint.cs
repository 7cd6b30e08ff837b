using PathPortal.Engine.Geometry;

namespace PathPortal.Engine.Paths;

/// <summary>One place on planned geometry, with derivatives by the chain's own length s (m, or rad on a turn on the spot). Work frame W.</summary>
/// <param name="Position">p (m).</param>
/// <param name="Orientation">R_WT.</param>
/// <param name="Tangent">dp/ds.</param>
/// <param name="TurnRate">Rotation per s, as a vector in axes of W: ω = TurnRate · ds/dt.</param>
/// <param name="Waypoint">Index of the waypoint the place lies before.</param>
/// <param name="Travel">Programmed tool travel from the path's first waypoint to here (m), corners counted unrounded.</param>
internal readonly record struct PathPoint(
    Vector3D Position, UnitQuaternion Orientation, Vector3D Tangent, Vector3D TurnRate, int Waypoint, double Travel);
