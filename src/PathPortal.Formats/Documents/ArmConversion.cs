using System.Collections.Immutable;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Geometry;

namespace PathPortal.Formats.Documents;

/// <summary>Arm documents in the engine's inner form: constant pose, then motion about or along z.</summary>
internal static class ArmConversion
{
    public static ArmModel ToArmModel(ArmDocument arm)
    {
        var joints = ImmutableArray.CreateBuilder<Joint>(arm.Joints.Count);

        // What the row before leaves between its motion and the next row; starts at the base.
        var rest = RigidTransform.Identity;
        foreach (var joint in arm.Joints)
        {
            var (before, zero, after) = arm.Kinematics switch
            {
                ArmKinematics.DhStandard => Standard(joint),
                ArmKinematics.DhModified => Modified(joint),
                _ => Frame(joint),
            };
            joints.Add(new(joint.Name, joint.Kind, rest * before, joint.Sign, zero, Limits(joint)));
            rest = after;
        }

        return new()
        {
            Name = arm.Name,
            Joints = joints.MoveToImmutable(),
            FlangeInLastJoint = rest * Conversion.ToTransform(arm.Flange),
            CharacteristicLength = Conversion.Metres(arm.CharacteristicLengthMm),
        };
    }

    // Rot z(θ) Trans z(d) Trans x(a) Rot x(α): both motions are about or along z and commute.
    private static (RigidTransform Before, double Zero, RigidTransform After) Standard(JointDocument row)
    {
        var link = RigidTransform.FromTranslation(Conversion.Metres(row.AMm), 0, 0) * AboutX(row.AlphaDeg);
        return row.Kind == JointKind.Revolute
            ? (RigidTransform.Identity, Conversion.Radians(row.ThetaDeg), AlongZ(row.DMm) * link)
            : (AboutZ(row.ThetaDeg), Conversion.Metres(row.DMm), link);
    }

    // Rot x(α) Trans x(a) Rot z(θ) Trans z(d).
    private static (RigidTransform Before, double Zero, RigidTransform After) Modified(JointDocument row)
    {
        var link = AboutX(row.AlphaDeg) * RigidTransform.FromTranslation(Conversion.Metres(row.AMm), 0, 0);
        return row.Kind == JointKind.Revolute
            ? (link * AlongZ(row.DMm), Conversion.Radians(row.ThetaDeg), RigidTransform.Identity)
            : (link * AboutZ(row.ThetaDeg), Conversion.Metres(row.DMm), RigidTransform.Identity);
    }

    // Pose, then motion about or along the axis: turn z onto the axis, move, turn back.
    private static (RigidTransform Before, double Zero, RigidTransform After) Frame(JointDocument joint)
    {
        var toAxis = new RigidTransform(AxisTurn.FromZ(new Vector3D(joint.AxisX, joint.AxisY, joint.AxisZ).Normalised()), Vector3D.Zero);
        var zero = joint.Kind == JointKind.Revolute ? Conversion.Radians(joint.Zero) : Conversion.Metres(joint.Zero);
        return (Conversion.ToTransform(joint.Pose) * toAxis, zero, toAxis.Inverse());
    }

    private static JointLimits Limits(JointDocument joint) => new()
    {
        Continuous = joint.Limits.Continuous,
        Low = Limit(joint.Kind, joint.Limits.Low),
        High = Limit(joint.Kind, joint.Limits.High),
        Speed = Limit(joint.Kind, joint.Limits.Speed),
        Acceleration = Limit(joint.Kind, joint.Limits.Acceleration),
        Jerk = Limit(joint.Kind, joint.Limits.Jerk),
    };

    private static Limit? Limit(JointKind kind, LimitDocument? limit) => limit is null
        ? null
        : new(kind == JointKind.Revolute ? Conversion.Radians(limit.Value) : Conversion.Metres(limit.Value), limit.Source);

    private static RigidTransform AlongZ(double mm) => RigidTransform.FromTranslation(0, 0, Conversion.Metres(mm));

    private static RigidTransform AboutX(double deg)
    {
        var (s, c) = ExactAtRightAngles(deg);
        return new(new(1, 0, 0, 0, c, -s, 0, s, c), Vector3D.Zero);
    }

    private static RigidTransform AboutZ(double deg)
    {
        var (s, c) = ExactAtRightAngles(deg);
        return new(new(c, -s, 0, s, c, 0, 0, 0, 1), Vector3D.Zero);
    }

    // Written as 90 degrees, a right angle is exact; π/2 in double is not, and closed-form wrists need exactness.
    private static (double Sin, double Cos) ExactAtRightAngles(double deg) => (deg % 360) switch
    {
        0 => (0, 1),
        90 or -270 => (1, 0),
        180 or -180 => (0, -1),
        270 or -90 => (-1, 0),
        var rest => Math.SinCos(Conversion.Radians(rest)),
    };
}
