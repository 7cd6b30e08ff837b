namespace PathPortal.Engine.Geometry;

/// <summary>
/// An angle with its sine and cosine. Written in degrees, multiples of 90° have exact sine and cosine; π/2 in double does not, and closed-form
/// wrists need the exact right angle. Written in radians nothing is snapped: 1.57 is not a right angle. Immutable; <c>default</c> is no angle
/// (cosine 0), use <see cref="Zero"/>.
/// </summary>
public readonly record struct Angle
{
    private Angle(double radians, double sin, double cos) => (Radians, Sin, Cos) = (radians, sin, cos);

    public static Angle Zero { get; } = new(0, 0, 1);

    /// <summary>The angle in radians, as written: not wrapped.</summary>
    public double Radians { get; }

    public double Sin { get; }

    public double Cos { get; }

    /// <summary>The angle of this many degrees.</summary>
    public static Angle FromDegrees(double degrees)
    {
        var radians = degrees * (Math.PI / 180);
        var (sin, cos) = (degrees % 360) switch
        {
            0 => (0.0, 1.0),
            90 or -270 => (1.0, 0.0),
            180 or -180 => (0.0, -1.0),
            270 or -90 => (-1.0, 0.0),
            var rest => Deterministic.SinCos(rest * (Math.PI / 180)),
        };
        return new(radians, sin, cos);
    }

    /// <summary>The angle of this many radians; sine and cosine of exactly this number.</summary>
    public static Angle FromRadians(double radians)
    {
        var (sin, cos) = Deterministic.SinCos(radians);
        return new(radians, sin, cos);
    }
}
