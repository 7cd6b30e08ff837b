namespace PathPortal.Engine.Geometry;

/// <summary>Frames made from a tool axis alone, which fixes five of six directions; the turn about the axis is chosen, not given.</summary>
public static class ToolAxisFrame
{
    // Where |from + to| falls below this, rounding leads the axis of the shortest turn and a perpendicular one is chosen; the vector then misses
    // by as much.
    private const double OppositeBelow = 1e-7;

    /// <summary>
    /// The rotation by the smallest angle that takes unit vector <paramref name="from"/> to unit vector <paramref name="to"/>. For opposite vectors
    /// every perpendicular axis would do: half a turn about the one nearest to x, to y where <paramref name="from"/> lies along x.
    /// </summary>
    public static UnitQuaternion ShortestTurn(Vector3D from, Vector3D to)
    {
        // |from + to| is twice the cosine of the half angle; taking it from 1 + cos instead would lose half the digits near 180°.
        var sum = (from + to).Norm;
        if (sum > OppositeBelow)
        {
            var axis = 1 / sum * from.Cross(to);
            return UnitQuaternion.FromComponents(sum / 2, axis.X, axis.Y, axis.Z);
        }

        var side = Math.Abs(from.X) < 1 - 1e-9 ? Vector3D.UnitX : Vector3D.UnitY;
        var perpendicular = (side - side.Dot(from) * from).Normalised();
        return UnitQuaternion.FromComponents(0, perpendicular.X, perpendicular.Y, perpendicular.Z);
    }

    /// <summary>
    /// The frame whose z axis is <paramref name="axis"/> (any length above zero), turned from the identity by the smallest angle. Exact where the
    /// axis lies along a coordinate axis.
    /// </summary>
    /// <exception cref="ArgumentException">The axis is zero or not finite.</exception>
    public static RotationMatrix FromAxis(Vector3D axis)
    {
        var z = axis.Normalised();
        return z switch
        {
            (0, 0, 1) => RotationMatrix.Identity,
            (0, 0, -1) => new(1, 0, 0, 0, -1, 0, 0, 0, -1),
            (1, 0, 0) => new(0, 0, 1, 0, 1, 0, -1, 0, 0),
            (-1, 0, 0) => new(0, 0, -1, 0, 1, 0, 1, 0, 0),
            (0, 1, 0) => new(1, 0, 0, 0, 0, 1, 0, -1, 0),
            (0, -1, 0) => new(1, 0, 0, 0, 0, -1, 0, 1, 0),
            _ => RotationMatrix.FromQuaternion(ShortestTurn(Vector3D.UnitZ, z)),
        };
    }
}
