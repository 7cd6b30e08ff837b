using System.Collections.Immutable;
using PathPortal.Engine.Geometry;

namespace PathPortal.Engine.Arms;

/// <summary>
/// One joint as a source describes it: the constant pose before its motion, motion about or along the local z axis by <c>Sign · q + Zero</c>, and a
/// constant pose after it, which <see cref="ToArm"/> moves into the next joint or the flange.
/// </summary>
/// <param name="Before">Constant pose before the motion, in the frame the link before ends in.</param>
/// <param name="Zero">Added to <c>Sign · q</c> (rad or m).</param>
/// <param name="After">Constant pose after the motion.</param>
public sealed record ChainLink(string Name, JointKind Kind, RigidTransform Before, int Sign, double Zero, RigidTransform After, JointLimits Limits)
{
    /// <summary>
    /// A joint that turns about or slides along any axis: the frame is turned so that the axis is z, and back after the motion. An axis along a
    /// coordinate axis turns exactly.
    /// </summary>
    /// <param name="origin">The joint's frame in the link before.</param>
    /// <param name="axis">Direction in the joint's frame, of any length above zero.</param>
    /// <exception cref="ArgumentException">The axis is zero or not finite.</exception>
    public static ChainLink AboutAxis(
        string name, JointKind kind, RigidTransform origin, Vector3D axis, int sign, double zero, JointLimits limits)
    {
        var zToAxis = new RigidTransform(ToolAxisFrame.FromAxis(axis), Vector3D.Zero);
        return new(name, kind, origin * zToAxis, sign, zero, zToAxis.Inverse(), limits);
    }

    /// <summary>The arm of these joints from base to flange.</summary>
    /// <param name="flangeInLastLink">The flange in the frame the last link ends in.</param>
    public static ArmModel ToArm(
        string name, IReadOnlyList<ChainLink> links, RigidTransform flangeInLastLink, double characteristicLength)
    {
        ArgumentNullException.ThrowIfNull(links);
        var joints = ImmutableArray.CreateBuilder<Joint>(links.Count);
        var rest = RigidTransform.Identity;
        foreach (var link in links)
        {
            joints.Add(new(link.Name, link.Kind, rest * link.Before, link.Sign, link.Zero, link.Limits));
            rest = link.After;
        }

        return new()
        {
            Name = name,
            Joints = joints.MoveToImmutable(),
            FlangeInLastJoint = rest * flangeInLastLink,
            CharacteristicLength = characteristicLength,
        };
    }
}
