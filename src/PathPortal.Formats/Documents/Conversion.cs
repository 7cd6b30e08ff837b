using PathPortal.Engine.Geometry;

namespace PathPortal.Formats.Documents;

/// <summary>Degrees and millimetres to radians and metres, and written orientations to rotations.</summary>
internal static class Conversion
{
    public static double Metres(double mm) => mm / 1000;

    public static double Radians(double deg) => Angle.FromDegrees(deg).Radians;

    public static RigidTransform ToTransform(PoseDocument pose) => new(
        ToRotation(pose.Orientation), new(Metres(pose.XMm), Metres(pose.YMm), Metres(pose.ZMm)));

    private static RotationMatrix ToRotation(OrientationDocument o) => o.IsQuaternion
        ? RotationMatrix.FromQuaternion(UnitQuaternion.FromComponents(o.W, o.X, o.Y, o.Z))
        : EulerAngles.ToMatrix(
            OrientationConvention.ToEuler(o.Convention), Angle.FromDegrees(o.FirstDeg), Angle.FromDegrees(o.SecondDeg),
            Angle.FromDegrees(o.ThirdDeg));
}
