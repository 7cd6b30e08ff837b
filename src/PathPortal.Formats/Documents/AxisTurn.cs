using PathPortal.Engine.Geometry;

namespace PathPortal.Formats.Documents;

/// <summary>Shortest turns between directions.</summary>
internal static class AxisTurn
{
    /// <summary>
    /// The rotation by the smallest angle that takes the unit vector <paramref name="from"/> to <paramref name="to"/>; for opposite vectors, where
    /// every perpendicular axis does, half a turn about the one nearest to x (y when from lies along x).
    /// </summary>
    public static UnitQuaternion Between(Vector3D from, Vector3D to)
    {
        var dot = from.Dot(to);
        var axis = from.Cross(to);

        // (1 + cos, sin · axis) is twice the half-angle quaternion scaled by cos of the half angle; it fades near 180°, hence the threshold.
        if (1 + dot > 1e-12)
        {
            return UnitQuaternion.FromComponents(1 + dot, axis.X, axis.Y, axis.Z);
        }

        var side = Vector3D.UnitX - from.X * from;
        side = (side.Norm > 1e-6 ? side : Vector3D.UnitY - from.Y * from).Normalised();
        return UnitQuaternion.FromComponents(0, side.X, side.Y, side.Z);
    }

    /// <summary>The shortest turn that takes z to the unit vector, as a matrix; exact where the vector is along a coordinate axis.</summary>
    public static RotationMatrix FromZ(Vector3D to) => to switch
    {
        (0, 0, 1) => RotationMatrix.Identity,
        (0, 0, -1) => new(1, 0, 0, 0, -1, 0, 0, 0, -1),
        (1, 0, 0) => new(0, 0, 1, 0, 1, 0, -1, 0, 0),
        (-1, 0, 0) => new(0, 0, -1, 0, 1, 0, 1, 0, 0),
        (0, 1, 0) => new(1, 0, 0, 0, 0, 1, 0, -1, 0),
        (0, -1, 0) => new(1, 0, 0, 0, 0, -1, 0, 1, 0),
        _ => RotationMatrix.FromQuaternion(Between(Vector3D.UnitZ, to)),
    };
}
