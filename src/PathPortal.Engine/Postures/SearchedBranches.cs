using PathPortal.Engine.Arms;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;

namespace PathPortal.Engine.Postures;

/// <summary>Branches by Newton's method from starts spread evenly over the joint ranges; may miss a branch, and says so in its names.</summary>
internal sealed class SearchedBranches(ArmModel arm, RigidTransform toolInFlange) : BranchSource
{
    private const int Starts = 256;

    // Solutions of a regular pose are isolated; of an arm with joints to spare they form curves, of which a spread is kept.
    private const double SameBranch = 1e-5; // rad, or of L
    private const double SameOnCurve = 0.35; // rad, or of L: 20°
    private const int MostOnCurve = 32;

    private const double RangeWithoutLimits = 2; // of L either way of zero, prismatic joints

    // An arm measured to be slightly off its closed form has branches beside the closed form's.
    private const double AlmostClosedForm = 0.05; // rad and m

    private readonly NewtonSolver newton = new(arm, toolInFlange);
    private readonly RigidTransform flangeInTool = toolInFlange.Inverse();
    private readonly SphericalWristArm? almost = SphericalWristArm.TryCreate(arm.Joints, arm.FlangeInLastJoint, AlmostClosedForm);

    public override bool IsClosedForm => false;

    public override List<Posture> Find(TaskKind task, RigidTransform toolInBase, ReadOnlySpan<double> near = default)
    {
        var spare = arm.Joints.Length > TaskRows.RowCount(task);
        var found = new List<double[]>();
        bool Keep(double[] joints)
        {
            if (newton.Solve(task, toolInBase, joints)
                && !found.Exists(f => AreSame(arm, f, joints, spare ? SameOnCurve : SameBranch)))
            {
                found.Add(joints);
            }

            return !spare || found.Count < MostOnCurve;
        }

        foreach (var joints in almost?.Solve(toolInBase * flangeInTool, near.IsEmpty ? stackalloc double[6] : near) ?? [])
        {
            Keep(joints);
        }

        for (var start = 1; start <= Starts; start++)
        {
            if (!Keep([.. arm.Joints.Select((joint, i) => StartValue(joint, HaltonSequence.Value(start, i)))]))
            {
                break;
            }
        }

        return [.. found.Select((joints, i) => new Posture([.. joints], $"start {i + 1} of {found.Count}"))];
    }

    private double StartValue(Joint joint, double share)
    {
        var half = joint.Kind == JointKind.Revolute ? Math.PI : RangeWithoutLimits * arm.CharacteristicLength;
        var low = joint.Limits.Low?.Value ?? (joint.Limits.High?.Value ?? half) - 2 * half;
        var high = joint.Limits.High?.Value ?? low + 2 * half;

        // A turn more reaches nothing new.
        return joint.Kind == JointKind.Revolute && high - low > JointTurns.Full
            ? -half + share * JointTurns.Full
            : low + share * (high - low);
    }
}
