namespace PathPortal.Engine.Geometry;

/// <summary>
/// A rotation as a unit quaternion, scalar first: R = (w, x, y, z) and its negative are the same rotation.
/// Immutable. Built only through factories, so the norm is 1 to rounding.
/// </summary>
public readonly record struct UnitQuaternion
{
    private UnitQuaternion(double w, double x, double y, double z) => (W, X, Y, Z) = (w, x, y, z);

    public static UnitQuaternion Identity => new(1, 0, 0, 0);

    public double W { get; }

    public double X { get; }

    public double Y { get; }

    public double Z { get; }

    /// <summary>The rotation with these components after scaling them to norm 1.</summary>
    /// <exception cref="ArgumentException">The components are all zero or not finite.</exception>
    public static UnitQuaternion FromComponents(double w, double x, double y, double z)
    {
        var norm = Math.Sqrt(w * w + x * x + y * y + z * z);
        return norm > 0 && double.IsFinite(norm)
            ? new(w / norm, x / norm, y / norm, z / norm)
            : throw new ArgumentException($"The quaternion ({w}, {x}, {y}, {z}) has no direction.");
    }

    /// <summary>
    /// The quaternion of a rotation matrix. Of the four equal forms the one with the largest divisor is taken, so that no angle, 180° included,
    /// loses digits (Shepperd 1978). The matrix is taken as orthonormal.
    /// </summary>
    public static UnitQuaternion FromMatrix(RotationMatrix r)
    {
        var trace = r.R11 + r.R22 + r.R33;
        if (trace >= r.R11 && trace >= r.R22 && trace >= r.R33)
        {
            return FromComponents(1 + trace, r.R32 - r.R23, r.R13 - r.R31, r.R21 - r.R12);
        }

        if (r.R11 >= r.R22 && r.R11 >= r.R33)
        {
            return FromComponents(r.R32 - r.R23, 1 + r.R11 - r.R22 - r.R33, r.R12 + r.R21, r.R13 + r.R31);
        }

        return r.R22 >= r.R33
            ? FromComponents(r.R13 - r.R31, r.R12 + r.R21, 1 - r.R11 + r.R22 - r.R33, r.R23 + r.R32)
            : FromComponents(r.R21 - r.R12, r.R13 + r.R31, r.R23 + r.R32, 1 - r.R11 - r.R22 + r.R33);
    }

    /// <summary>The inverse rotation.</summary>
    public UnitQuaternion Conjugate() => new(W, -X, -Y, -Z);

    /// <summary>The other sign: the same rotation.</summary>
    public UnitQuaternion Negated() => new(-W, -X, -Y, -Z);

    /// <summary>Four-dimensional scalar product, cos of half the angle between the two rotations up to sign.</summary>
    public double Dot(UnitQuaternion other) => W * other.W + X * other.X + Y * other.Y + Z * other.Z;

    /// <summary>Hamilton product: rotation b first, then a, when applied to column vectors.</summary>
    public static UnitQuaternion operator *(UnitQuaternion a, UnitQuaternion b) => FromComponents(
        a.W * b.W - a.X * b.X - a.Y * b.Y - a.Z * b.Z,
        a.W * b.X + a.X * b.W + a.Y * b.Z - a.Z * b.Y,
        a.W * b.Y - a.X * b.Z + a.Y * b.W + a.Z * b.X,
        a.W * b.Z + a.X * b.Y - a.Y * b.X + a.Z * b.W);
}
