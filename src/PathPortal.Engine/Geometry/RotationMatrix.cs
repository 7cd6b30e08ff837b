namespace PathPortal.Engine.Geometry;

/// <summary>
/// A rotation R_AB, 3×3, row-major names: <c>Rij</c> is row i, column j. Column j holds axis j of frame B in axes of A. Immutable.
/// </summary>
public readonly record struct RotationMatrix(
    double R11, double R12, double R13,
    double R21, double R22, double R23,
    double R31, double R32, double R33)
{
    public static RotationMatrix Identity => new(1, 0, 0, 0, 1, 0, 0, 0, 1);

    /// <summary>x axis of B in axes of A.</summary>
    public Vector3D AxisX => new(R11, R21, R31);

    /// <summary>y axis of B in axes of A.</summary>
    public Vector3D AxisY => new(R12, R22, R32);

    /// <summary>z axis of B in axes of A.</summary>
    public Vector3D AxisZ => new(R13, R23, R33);

    /// <summary>The element in a row and column from 0.</summary>
    public double this[int row, int column] => (3 * row + column) switch
    {
        0 => R11,
        1 => R12,
        2 => R13,
        3 => R21,
        4 => R22,
        5 => R23,
        6 => R31,
        7 => R32,
        8 => R33,
        _ => throw new ArgumentOutOfRangeException(nameof(row), $"({row}, {column}) is not in a 3×3 matrix."),
    };

    public static RotationMatrix FromAxes(Vector3D x, Vector3D y, Vector3D z) =>
        new(x.X, y.X, z.X, x.Y, y.Y, z.Y, x.Z, y.Z, z.Z);

    public static RotationMatrix FromQuaternion(UnitQuaternion q)
    {
        double xx = q.X * q.X, yy = q.Y * q.Y, zz = q.Z * q.Z;
        double xy = q.X * q.Y, xz = q.X * q.Z, yz = q.Y * q.Z;
        double wx = q.W * q.X, wy = q.W * q.Y, wz = q.W * q.Z;
        return new(
            1 - 2 * (yy + zz), 2 * (xy - wz), 2 * (xz + wy),
            2 * (xy + wz), 1 - 2 * (xx + zz), 2 * (yz - wx),
            2 * (xz - wy), 2 * (yz + wx), 1 - 2 * (xx + yy));
    }

    /// <summary>Turn about x.</summary>
    public static RotationMatrix AboutX(Angle angle) => new(1, 0, 0, 0, angle.Cos, -angle.Sin, 0, angle.Sin, angle.Cos);

    /// <summary>Turn about y.</summary>
    public static RotationMatrix AboutY(Angle angle) => new(angle.Cos, 0, angle.Sin, 0, 1, 0, -angle.Sin, 0, angle.Cos);

    /// <summary>Turn about z.</summary>
    public static RotationMatrix AboutZ(Angle angle) => new(angle.Cos, -angle.Sin, 0, angle.Sin, angle.Cos, 0, 0, 0, 1);

    public static RotationMatrix operator *(RotationMatrix a, RotationMatrix b) =>
        FromAxes(a * b.AxisX, a * b.AxisY, a * b.AxisZ);

    public static Vector3D operator *(RotationMatrix r, Vector3D v) => new(
        r.R11 * v.X + r.R12 * v.Y + r.R13 * v.Z,
        r.R21 * v.X + r.R22 * v.Y + r.R23 * v.Z,
        r.R31 * v.X + r.R32 * v.Y + r.R33 * v.Z);

    /// <summary>The inverse, R_BA.</summary>
    public RotationMatrix Transposed() => new(R11, R21, R31, R12, R22, R32, R13, R23, R33);
}
