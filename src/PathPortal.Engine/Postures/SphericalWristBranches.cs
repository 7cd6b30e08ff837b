using PathPortal.Engine.Arms;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;

namespace PathPortal.Engine.Postures;

/// <summary>Up to eight branches from the closed form, each finished by Newton.</summary>
internal sealed class SphericalWristBranches(ArmModel arm, RigidTransform toolInFlange, SphericalWristArm spherical) : BranchSource
{
    // Branches closer than this (rad) have run together: a straight elbow or wrist leaves them √ε apart, about 1e-8.
    private const double SameBranch = 1e-6;

    private readonly NewtonSolver newton = new(arm, toolInFlange);
    private readonly RigidTransform flangeInTool = toolInFlange.Inverse();

    public override bool IsClosedForm => true;

    public override List<Posture> Find(TaskKind task, RigidTransform toolInBase, ReadOnlySpan<double> near = default)
    {
        ReadOnlySpan<double> free = near.IsEmpty ? stackalloc double[6] : near;
        var branches = new List<Posture>(8);
        foreach (var joints in spherical.Solve(toolInBase * flangeInTool, free))
        {
            if (newton.Solve(task, toolInBase, joints) && !branches.Exists(b => AreSame(arm, b.Joints.AsSpan(), joints, SameBranch)))
            {
                branches.Add(new([.. joints], spherical.Words.Describe(Motions(joints))));
            }
        }

        return branches;
    }

    private double[] Motions(double[] joints) => [.. joints.Select((q, i) => arm.Joints[i].Sign * q + arm.Joints[i].Zero)];
}
