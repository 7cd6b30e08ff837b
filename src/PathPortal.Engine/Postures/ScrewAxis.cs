using PathPortal.Engine.Geometry;

namespace PathPortal.Engine.Postures;

/// <summary>A joint axis in the base frame with every motion at zero: unit direction and a point on it (m).</summary>
internal readonly record struct ScrewAxis(Vector3D Direction, Vector3D Point)
{
    /// <summary>A direction turned about this axis by θ.</summary>
    public Vector3D Turn(double angle, Vector3D v)
    {
        var (sin, cos) = Deterministic.SinCos(angle);
        var along = Direction.Dot(v) * Direction;
        return along + cos * (v - along) + sin * Direction.Cross(v);
    }

    /// <summary>A point turned about this axis by θ.</summary>
    public Vector3D Move(double angle, Vector3D p) => Point + Turn(angle, p - Point);

    /// <summary>The turn about this axis that takes the direction of v nearest to that of w (rad, in (−π, π]).</summary>
    public double AngleBetween(Vector3D v, Vector3D w)
    {
        var vAcross = v - Direction.Dot(v) * Direction;
        var wAcross = w - Direction.Dot(w) * Direction;
        return Deterministic.Atan2(Direction.Dot(vAcross.Cross(wAcross)), vAcross.Dot(wAcross));
    }

    /// <summary>The rotation about this axis by θ.</summary>
    public RotationMatrix Rotation(double angle) =>
        RotationMatrix.FromAxes(Turn(angle, Vector3D.UnitX), Turn(angle, Vector3D.UnitY), Turn(angle, Vector3D.UnitZ));

    /// <summary>Distance of a point from the axis (m).</summary>
    public double DistanceTo(Vector3D p) => Direction.Cross(p - Point).Norm;
}
