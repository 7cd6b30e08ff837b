using System.Collections.Immutable;
using PathPortal.Engine.Geometry;

namespace PathPortal.Engine.Arms;

/// <summary>Where every part of an arm is for given joint values: forward kinematics. Immutable; poses in the base frame B.</summary>
/// <param name="JointFrames">
/// X_Bi of every joint after its motion, base to flange. Column z of each is the joint's axis, its origin a point on it.
/// </param>
/// <param name="Flange">X_BF, the mechanical interface.</param>
public sealed record ArmPose(ImmutableArray<RigidTransform> JointFrames, RigidTransform Flange)
{
    /// <summary>Forward kinematics.</summary>
    /// <param name="joints">Controller's joint values (rad or m), as many as the arm has joints.</param>
    /// <exception cref="ArgumentException">The number of values is wrong.</exception>
    public static ArmPose Compute(ArmModel arm, ReadOnlySpan<double> joints)
    {
        ArgumentNullException.ThrowIfNull(arm);
        if (joints.Length != arm.Joints.Length)
        {
            throw new ArgumentException($"The arm has {arm.Joints.Length} joints, but {joints.Length} values are given.", nameof(joints));
        }

        var frames = ImmutableArray.CreateBuilder<RigidTransform>(joints.Length);
        var X_Bi = RigidTransform.Identity;
        for (var i = 0; i < joints.Length; i++)
        {
            X_Bi = X_Bi * arm.Joints[i].PoseInPrevious * Motion(arm.Joints[i], joints[i]);
            frames.Add(X_Bi);
        }

        return new(frames.MoveToImmutable(), X_Bi * arm.FlangeInLastJoint);
    }

    /// <summary>X_BT for a tool with pose X_FT in the flange.</summary>
    public RigidTransform Tool(RigidTransform toolInFlange) => Flange * toolInFlange;

    /// <summary>The motion of one joint: about or along z by sign · q + zero.</summary>
    internal static RigidTransform Motion(Joint joint, double q)
    {
        var motion = joint.Sign * q + joint.Zero;
        return joint.Kind == JointKind.Revolute
            ? new(RotationMatrix.AboutZ(Angle.FromRadians(motion)), Vector3D.Zero)
            : RigidTransform.FromTranslation(0, 0, motion);
    }
}
