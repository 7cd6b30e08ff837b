using System.Collections.Immutable;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;

namespace PathPortal.Engine.Postures;

/// <summary>Where the branches of a tool pose come from, by the kind of arm. Branches are distinct beyond whole turns and have no regard to limits.</summary>
internal abstract class BranchSource
{
    public abstract bool IsClosedForm { get; }

    /// <summary>The branches that reach X_BT in the task's rows.</summary>
    /// <param name="near">Joint values to keep where the pose leaves a joint undetermined; empty: zero.</param>
    public abstract List<Posture> Find(TaskKind task, RigidTransform toolInBase, ReadOnlySpan<double> near = default);

    public static BranchSource For(ArmModel arm, RigidTransform toolInFlange)
    {
        var tolerance = PostureFinder.ClosedFormTolerance;
        if (SphericalWristArm.TryCreate(arm.Joints, arm.FlangeInLastJoint, tolerance) is { } spherical)
        {
            return new SphericalWristBranches(arm, toolInFlange, spherical);
        }

        if (arm.Joints is [{ Kind: JointKind.Prismatic } track, .. { Length: 6 } carried]
            && SphericalWristArm.TryCreate(carried, arm.FlangeInLastJoint, tolerance) is not null)
        {
            var rider = arm with { Joints = carried };
            return new TrackBranches(track, new SphericalWristBranches(
                rider, toolInFlange, SphericalWristArm.TryCreate(carried, arm.FlangeInLastJoint, tolerance)!));
        }

        return new SearchedBranches(arm, toolInFlange);
    }

    /// <summary>True when two postures differ by less than a distance in every joint, whole turns of revolute joints aside.</summary>
    public static bool AreSame(ArmModel arm, ReadOnlySpan<double> a, ReadOnlySpan<double> b, double distance)
    {
        for (var i = 0; i < a.Length; i++)
        {
            var difference = a[i] - b[i];
            difference = arm.Joints[i].Kind == JointKind.Revolute ? JointTurns.Wrap(difference) : difference / arm.CharacteristicLength;
            if (!(Math.Abs(difference) < distance))
            {
                return false;
            }
        }

        return true;
    }
}
