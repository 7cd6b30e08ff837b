using PathPortal.Engine.Arms;
using PathPortal.Engine.Geometry;

namespace PathPortal.Engine.Tests;

/// <summary>Invented arms for tests.</summary>
public static class TestArms
{
    private static readonly Limit Wide = new(2 * Math.PI, "invented");

    /// <summary>
    /// The six-joint arm of the reference runs: standard DH, spherical wrist, shoulder offset 50 mm, elbow offset 30 mm; L = 1 m. Joint limits ±360°.
    /// </summary>
    public static ArmModel SixJoints(JointLimits? limits = null) => new StandardDhTable(
        [
            Row(1, 0.05, 90, 0.40, limits),
            Row(2, 0.42, 0, 0, limits),
            Row(3, 0.03, 90, 0, limits),
            Row(4, 0, -90, 0.38, limits),
            Row(5, 0, 90, 0, limits),
            Row(6, 0, 0, 0.09, limits),
        ],
        RigidTransform.Identity).ToArm("invented, six joints", 1);

    /// <summary>The same arm on a track of 3 m along base y.</summary>
    public static ArmModel OnTrack()
    {
        var arm = SixJoints();
        var alongY = new RigidTransform(RotationMatrix.AboutX(Angle.FromDegrees(-90)), Vector3D.Zero);
        var track = new Joint(
            "track", JointKind.Prismatic, alongY, 1, 0, new() { Low = new(0, "invented"), High = new(3, "invented"), Speed = new(1, "invented") });
        var first = arm.Joints[0] with { PoseInPrevious = alongY.Inverse() * arm.Joints[0].PoseInPrevious };
        return arm with { Joints = [track, first, .. arm.Joints[1..]] };
    }

    public static JointLimits Limits(double low, double high) => new() { Low = new(low, "invented"), High = new(high, "invented") };

    private static DhRow Row(int number, double a, double alphaDegrees, double d, JointLimits? limits) => new(
        $"j{number}", JointKind.Revolute, a, Angle.FromDegrees(alphaDegrees), d, Angle.Zero, 1, 0,
        limits ?? new() { Low = new(-Wide.Value, Wide.Source), High = Wide });
}
