namespace PathPortal.Engine.Geometry;

/// <summary>
/// Velocity of a rigid body: linear velocity of a named point (m/s) and angular velocity (rad/s), both in axes of one frame. Everywhere in the
/// engine the point is the tool centre point and the axes are those of the base, linear part first. Immutable.
/// </summary>
public readonly record struct Twist(Vector3D Linear, Vector3D Angular)
{
    public static Twist Zero => default;

    public static Twist operator +(Twist a, Twist b) => new(a.Linear + b.Linear, a.Angular + b.Angular);

    public static Twist operator *(double s, Twist a) => new(s * a.Linear, s * a.Angular);

    /// <summary>The same motion seen at a point displaced by r (m, same axes): v + ω × r.</summary>
    public Twist AtPoint(Vector3D r) => new(Linear + Angular.Cross(r), Angular);

    /// <summary>The same motion at the same point in other axes: this in axes of B, R_AB given, gives axes of A.</summary>
    public Twist InAxesOf(RotationMatrix rotation) => new(rotation * Linear, rotation * Angular);
}
