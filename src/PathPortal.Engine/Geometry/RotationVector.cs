namespace PathPortal.Engine.Geometry;

/// <summary>
/// Rotation vectors r = angle · axis (rad), the logarithm of a rotation, and back. The angle is in [0, π]; the functions hold at 0 and at 180°.
/// </summary>
public static class RotationVector
{
    // Below this half angle sin(x)/x and its inverse are replaced by their series; the next term, x⁴/120, is then below 1e-18.
    private const double SeriesBelow = 1e-4;

    /// <summary>
    /// The rotation vector of R_AB in axes of A (and of B: the axis is the same in both). At exactly 180°, where both signs of the axis are right,
    /// the quaternion of <see cref="UnitQuaternion.FromMatrix"/> decides.
    /// </summary>
    public static Vector3D Of(RotationMatrix rotation) => Of(UnitQuaternion.FromMatrix(rotation));

    /// <summary>The rotation vector of a unit quaternion: 2 atan2(|v|, |w|) about v, by the shorter way.</summary>
    public static Vector3D Of(UnitQuaternion q)
    {
        // q and −q are one rotation; the one with w ≥ 0 turns by at most 180°.
        var (w, x, y, z) = q.W < 0 ? (-q.W, -q.X, -q.Y, -q.Z) : (q.W, q.X, q.Y, q.Z);
        var sine = Math.Sqrt(x * x + y * y + z * z);
        var scale = sine < SeriesBelow
            ? 2 / w * (1 - sine * sine / (3 * w * w))
            : 2 * Deterministic.Atan2(sine, w) / sine;
        return new(scale * x, scale * y, scale * z);
    }

    /// <summary>The rotation that turns by |r| about r, as a quaternion.</summary>
    public static UnitQuaternion ToQuaternion(Vector3D r)
    {
        var half = r.Norm / 2;
        var (sin, cos) = Deterministic.SinCos(half);
        var scale = half < SeriesBelow ? 0.5 * (1 - half * half / 6) : 0.5 * sin / half;
        return UnitQuaternion.FromComponents(cos, scale * r.X, scale * r.Y, scale * r.Z);
    }

    /// <summary>The rotation that turns by |r| about r, as a matrix (Rodrigues).</summary>
    public static RotationMatrix ToMatrix(Vector3D r) => RotationMatrix.FromQuaternion(ToQuaternion(r));

    /// <summary>The angle between two orientations, in [0, π] (rad).</summary>
    public static double AngleBetween(UnitQuaternion a, UnitQuaternion b) => Of(a.Conjugate() * b).Norm;
}
