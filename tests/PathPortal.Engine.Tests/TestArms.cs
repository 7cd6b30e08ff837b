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

    /// <summary>A planar arm of parallel joints with these link lengths (m).</summary>
    public static ArmModel Planar(params double[] links) => new StandardDhTable(
        [.. links.Select((a, i) => Row(i + 1, a, 0, 0, null))], RigidTransform.Identity).ToArm("planar", 1);

    /// <summary>Any chain: oblique axes, offsets up to 0.4 m, every fourth joint or so sliding, signs and zeros of all kinds.</summary>
    public static ArmModel Random(Random random, int joints) => new()
    {
        Name = "random",
        Joints =
        [
            .. Enumerable.Range(1, joints).Select(number => new Joint(
                $"j{number}",
                random.Next(4) == 0 ? JointKind.Prismatic : JointKind.Revolute,
                random.Pose(0.4),
                random.Next(2) == 0 ? 1 : -1,
                random.Between(-1, 1),
                new())),
        ],
        FlangeInLastJoint = random.Pose(0.2),
        CharacteristicLength = random.Between(0.2, 2),
    };

    /// <summary>
    /// A six-joint arm with axes 2 and 3 parallel and a wrist point, everything else at random: oblique axes 1 and 5, offsets, signs, zeros.
    /// </summary>
    public static ArmModel RandomSphericalWrist(Random random)
    {
        RigidTransform Turn() => new(random.Rotation(), Vector3D.Zero);
        RigidTransform AlongZ() => RigidTransform.FromTranslation(0, 0, random.Between(-0.2, 0.2));
        RigidTransform Oblique()
        {
            // Far enough from parallel for the wrist to be one.
            var tilt = new RigidTransform(RotationMatrix.AboutX(Angle.FromRadians(random.Between(0.6, 2.5))), Vector3D.Zero);
            return new RigidTransform(RotationMatrix.AboutZ(Angle.FromRadians(random.Between(-3, 3))), Vector3D.Zero) * tilt;
        }

        RigidTransform[] poses =
        [
            random.Pose(0.3),
            RigidTransform.FromTranslation(random.Between(-0.3, 0.3), random.Between(-0.2, 0.2), random.Between(0, 0.4)) * Oblique(),
            RigidTransform.FromTranslation(random.Between(0.2, 0.8), random.Between(-0.2, 0.2), random.Between(-0.2, 0.2))
                * new RigidTransform(RotationMatrix.AboutZ(Angle.FromRadians(random.Between(-3, 3))), Vector3D.Zero),
            RigidTransform.FromTranslation(random.Between(0.2, 0.8), random.Between(-0.2, 0.2), random.Between(-0.2, 0.2)) * Turn(),
            Oblique(),
            Oblique(),
        ];

        // The points on axes 4 and 6 may lie anywhere along them: slide the frame before the joint and back after it.
        var slide4 = AlongZ();
        poses[3] *= slide4;
        poses[4] = slide4.Inverse() * poses[4];
        var slide6 = AlongZ();
        poses[5] *= slide6;
        return new()
        {
            Name = "random, spherical wrist",
            Joints =
            [
                .. poses.Select((pose, i) => new Joint(
                    $"j{i + 1}", JointKind.Revolute, pose, random.Next(2) == 0 ? 1 : -1, random.Between(-1, 1), Limits(-Math.PI, Math.PI))),
            ],
            FlangeInLastJoint = random.Pose(0.2),
            CharacteristicLength = random.Between(0.3, 1.5),
        };
    }

    /// <summary>Joint values in (−π, π) rad or (−0.5, 0.5) m.</summary>
    public static double[] RandomJoints(Random random, ArmModel arm) =>
        [.. arm.Joints.Select(j => j.Kind == JointKind.Revolute ? random.Between(-Math.PI, Math.PI) : random.Between(-0.5, 0.5))];

    public static JointLimits Limits(double low, double high) => new() { Low = new(low, "invented"), High = new(high, "invented") };

    private static DhRow Row(int number, double a, double alphaDegrees, double d, JointLimits? limits) => new(
        $"j{number}", JointKind.Revolute, a, Angle.FromDegrees(alphaDegrees), d, Angle.Zero, 1, 0,
        limits ?? new() { Low = new(-Wide.Value, Wide.Source), High = Wide });
}
