using PathPortal.Engine.Geometry;

namespace PathPortal.Engine.Paths;

/// <summary>The reference at one time.</summary>
/// <param name="Velocity">Of the tool centre point (m/s), axes of W.</param>
/// <param name="TurnVelocity">ω (rad/s), axes of W.</param>
internal readonly record struct ReferenceState(PathPoint Place, Vector3D Velocity, Vector3D TurnVelocity);
