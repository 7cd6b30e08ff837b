using PathPortal.Engine.Geometry;

namespace PathPortal.Formats.Documents;

/// <summary>Degrees and millimetres to radians and metres, and written orientations to rotations.</summary>
internal static class Conversion
{
    public const double RadPerDeg = Math.PI / 180;

    public static double Metres(double mm) => mm / 1000;

    public static double Radians(double deg) => deg * RadPerDeg;

    public static RigidTransform ToTransform(PoseDocument pose) => new(
        RotationMatrix.FromQuaternion(ToQuaternion(pose.Orientation)),
        new(Metres(pose.XMm), Metres(pose.YMm), Metres(pose.ZMm)));

    public static UnitQuaternion ToQuaternion(OrientationDocument o) => o.IsQuaternion
        ? UnitQuaternion.FromComponents(o.W, o.X, o.Y, o.Z)
        : FromAngles(o.Convention, Radians(o.FirstDeg), Radians(o.SecondDeg), Radians(o.ThirdDeg));

    /// <summary>The rotation of a named convention (<see cref="OrientationConvention"/>), angles in radians in the order the axes are named.</summary>
    public static UnitQuaternion FromAngles(string convention, double first, double second, double third)
    {
        var (a, b, c) = (About(convention[^3], first), About(convention[^2], second), About(convention[^1], third));

        // A turn about a fixed axis multiplies from the left, one about a moving axis from the right.
        return convention.StartsWith("fixed_", StringComparison.Ordinal) ? c * b * a : a * b * c;
    }

    private static UnitQuaternion About(char axis, double angle)
    {
        var (s, c) = Math.SinCos(angle / 2);
        return UnitQuaternion.FromComponents(c, axis == 'x' ? s : 0, axis == 'y' ? s : 0, axis == 'z' ? s : 0);
    }
}
