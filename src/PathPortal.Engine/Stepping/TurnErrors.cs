using System.Runtime.CompilerServices;

namespace PathPortal.Engine.Stepping;

/// <summary>Orientation errors between a reference R_BD and a tool R_BT, rotation matrices by rows.</summary>
internal static unsafe class TurnErrors
{
    // Below this sine the series 1 + s²/6 of arcsin(s)/s is exact to rounding.
    private const double SeriesBelow = 1e-4;

    /// <summary>
    /// The rotation vector of R_BD R_BTᵀ in base axes, by way of the quaternion with the largest component as divisor, so that it holds at every
    /// angle up to half a turn. Returns the angle in [0, π].
    /// </summary>
    [MethodImpl(MethodImplOptions.NoInlining)]
    public static T Pose<T>(T* D, T* R, T* vector)
        where T : unmanaged, ILane<T>
    {
        var m11 = Row(D, R, 0, 0);
        var m22 = Row(D, R, 1, 1);
        var m33 = Row(D, R, 2, 2);
        var (m12, m21) = (Row(D, R, 0, 1), Row(D, R, 1, 0));
        var (m13, m31) = (Row(D, R, 0, 2), Row(D, R, 2, 0));
        var (m23, m32) = (Row(D, R, 1, 2), Row(D, R, 2, 1));

        // Four times the squares of the components, and the products with the largest one.
        var one = T.Of(1);
        var w = one + m11 + m22 + m33;
        var x = one + m11 - m22 - m33;
        var y = one - m11 + m22 - m33;
        var z = one - m11 - m22 + m33;
        var (a, b, c) = (m32 - m23, m13 - m31, m21 - m12);
        var (xy, xz, yz) = (m12 + m21, m13 + m31, m23 + m32);

        var largest = w;
        var (qw, qx, qy, qz) = (w, a, b, c);
        var better = x > largest;
        largest = T.Select(better, x, largest);
        (qw, qx, qy, qz) = (T.Select(better, a, qw), T.Select(better, x, qx), T.Select(better, xy, qy), T.Select(better, xz, qz));
        better = y > largest;
        largest = T.Select(better, y, largest);
        (qw, qx, qy, qz) = (T.Select(better, b, qw), T.Select(better, xy, qx), T.Select(better, y, qy), T.Select(better, yz, qz));
        better = z > largest;
        largest = T.Select(better, z, largest);
        (qw, qx, qy, qz) = (T.Select(better, c, qw), T.Select(better, xz, qx), T.Select(better, yz, qy), T.Select(better, z, qz));

        var scale = T.Of(0.5) / T.Sqrt(largest);
        scale = T.CopySign(scale, qw);
        (qw, qx, qy, qz) = (scale * qw, scale * qx, scale * qy, scale * qz);

        var sine = T.Sqrt(T.PlusProduct(qx, qx, T.PlusProduct(qy, qy, qz * qz)));
        var angle = T.Of(2) * LaneMath.Atan2(sine, qw);
        var factor = T.Select(sine < T.Of(SeriesBelow), T.Of(2) * T.PlusProduct(sine * sine, T.Of(1.0 / 6), one), angle / sine);
        (vector[0], vector[1], vector[2]) = (factor * qx, factor * qy, factor * qz);
        return angle;
    }

    /// <summary>
    /// The swing that takes the tool's z axis to the reference's by the shortest way, x and y components in tool axes (its z component is zero).
    /// Returns its angle in [0, π]. For opposite axes half a turn about the tool's x axis.
    /// </summary>
    [MethodImpl(MethodImplOptions.NoInlining)]
    public static T Swing<T>(T* D, T* R, T* vector)
        where T : unmanaged, ILane<T>
    {
        // The reference axis in tool coordinates; the tool's own is (0, 0, 1), so the cross product is (−y, x, 0).
        var x = Column(R, D, 0);
        var y = Column(R, D, 1);
        var z = Column(R, D, 2);
        var sine = T.Sqrt(T.PlusProduct(x, x, y * y));
        var angle = LaneMath.Atan2(sine, z);
        var small = sine < T.Of(SeriesBelow);
        var factor = T.Select(small, T.PlusProduct(sine * sine, T.Of(1.0 / 6), T.Of(1)), angle / sine);
        var opposite = small & (z < T.Of(0));
        vector[0] = T.Select(opposite, angle, -(factor * y));
        vector[1] = T.Select(opposite, T.Of(0), factor * x);
        vector[2] = T.Of(0);
        return angle;
    }

    // Element of D Rᵀ.
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static T Row<T>(T* D, T* R, int i, int j)
        where T : unmanaged, ILane<T> => T.PlusProduct(
        D[3 * i], R[3 * j], T.PlusProduct(D[3 * i + 1], R[3 * j + 1], D[3 * i + 2] * R[3 * j + 2]));

    // Component of D's z axis along R's axis j.
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static T Column<T>(T* R, T* D, int j)
        where T : unmanaged, ILane<T> => T.PlusProduct(R[j], D[2], T.PlusProduct(R[3 + j], D[5], R[6 + j] * D[8]));
}
