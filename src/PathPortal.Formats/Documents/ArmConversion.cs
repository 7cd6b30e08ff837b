using PathPortal.Engine.Arms;
using PathPortal.Engine.Geometry;

namespace PathPortal.Formats.Documents;

/// <summary>Arm documents in the engine's inner form.</summary>
internal static class ArmConversion
{
    public static ArmModel ToArmModel(ArmDocument arm)
    {
        var flange = Conversion.ToTransform(arm.Flange);
        var length = Conversion.Metres(arm.CharacteristicLengthMm);
        return arm.Kinematics switch
        {
            ArmKinematics.DhStandard => new StandardDhTable([.. arm.Joints.Select(Row)], flange).ToArm(arm.Name, length),
            ArmKinematics.DhModified => new ModifiedDhTable([.. arm.Joints.Select(Row)], flange).ToArm(arm.Name, length),
            _ => ChainLink.ToArm(arm.Name, [.. arm.Joints.Select(Link)], flange, length),
        };
    }

    // The written θ and d are constant turns and shifts of the row, so a right angle stays exact; motion adds to them, and no other zero is needed.
    private static DhRow Row(JointDocument joint) => new(
        joint.Name, joint.Kind, Conversion.Metres(joint.AMm), Angle.FromDegrees(joint.AlphaDeg),
        Conversion.Metres(joint.DMm), Angle.FromDegrees(joint.ThetaDeg), joint.Sign, Zero: 0, Limits(joint));

    private static ChainLink Link(JointDocument joint) => ChainLink.AboutAxis(
        joint.Name, joint.Kind, Conversion.ToTransform(joint.Pose), new(joint.AxisX, joint.AxisY, joint.AxisZ), joint.Sign,
        joint.Kind == JointKind.Revolute ? Conversion.Radians(joint.Zero) : Conversion.Metres(joint.Zero), Limits(joint));

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
}
