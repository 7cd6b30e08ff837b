namespace PathPortal.Engine.Geometry;

/// <summary>A vector or point in space. Metres unless the name says otherwise; the frame is stated by whoever holds it. Immutable.</summary>
public readonly record struct Vector3D(double X, double Y, double Z)
{
    public static Vector3D Zero => default;

    public static Vector3D UnitX => new(1, 0, 0);

    public static Vector3D UnitY => new(0, 1, 0);

    public static Vector3D UnitZ => new(0, 0, 1);

    /// <summary>Euclidean length, in the unit of the components.</summary>
    public double Norm => Math.Sqrt(Dot(this));

    public bool IsFinite => double.IsFinite(X) && double.IsFinite(Y) && double.IsFinite(Z);

    public static Vector3D operator +(Vector3D a, Vector3D b) => new(a.X + b.X, a.Y + b.Y, a.Z + b.Z);

    public static Vector3D operator -(Vector3D a, Vector3D b) => new(a.X - b.X, a.Y - b.Y, a.Z - b.Z);

    public static Vector3D operator -(Vector3D a) => new(-a.X, -a.Y, -a.Z);

    public static Vector3D operator *(double s, Vector3D a) => new(s * a.X, s * a.Y, s * a.Z);

    public double Dot(Vector3D other) => X * other.X + Y * other.Y + Z * other.Z;

    public Vector3D Cross(Vector3D other) =>
        new(Y * other.Z - Z * other.Y, Z * other.X - X * other.Z, X * other.Y - Y * other.X);

    /// <summary>This vector at length 1.</summary>
    /// <exception cref="ArgumentException">The vector is zero or not finite, so it has no direction.</exception>
    public Vector3D Normalised()
    {
        var norm = Norm;
        return norm > 0 && double.IsFinite(norm)
            ? (1 / norm) * this
            : throw new ArgumentException($"The vector ({X}, {Y}, {Z}) has no direction.");
    }
}
