using System.Collections.Immutable;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Geometry;

namespace PathPortal.Engine.Postures;

/// <summary>
/// Closed-form postures of a six-joint arm whose axes 2 and 3 are parallel and whose axes 4, 5 and 6 meet in one point (Pieper 1968), written with
/// screw axes at motion zero: G = e₁e₂e₃e₄e₅e₆ M. Offsets at shoulder and elbow and oblique axes are allowed.
/// The angles are exact to rounding away from singular postures; callers finish them by Newton.
/// </summary>
internal sealed class SphericalWristArm
{
    // Two axes closer to parallel than this (sine of the angle) cannot be told apart by the formulas; links shorter than this (m) are no links.
    private const double Degenerate = 1e-6;

    private readonly ScrewAxis[] axes;
    private readonly RigidTransform flangeAtZeroInverse;
    private readonly Vector3D wristCentre;
    private readonly ImmutableArray<Joint> joints;

    private SphericalWristArm(ImmutableArray<Joint> joints, ScrewAxis[] axes, RigidTransform flangeAtZero, Vector3D wristCentre)
    {
        this.joints = joints;
        this.axes = axes;
        this.wristCentre = wristCentre;
        flangeAtZeroInverse = flangeAtZero.Inverse();
        Words = new(axes, wristCentre);
    }

    /// <summary>Names branches in words.</summary>
    public SphericalWristWords Words { get; }

    /// <summary>The arm's closed form, or null where it has none.</summary>
    /// <param name="joints">Six joints.</param>
    /// <param name="tolerance">Largest departure from parallel (rad) and from one common point (m).</param>
    public static SphericalWristArm? TryCreate(ImmutableArray<Joint> joints, RigidTransform flangeInLastJoint, double tolerance)
    {
        if (joints.Length != 6 || joints.Any(j => j.Kind != JointKind.Revolute))
        {
            return null;
        }

        var axes = new ScrewAxis[6];
        var X_Bi = RigidTransform.Identity;
        for (var i = 0; i < 6; i++)
        {
            X_Bi *= joints[i].PoseInPrevious;
            axes[i] = new(X_Bi.Rotation.AxisZ, X_Bi.Translation);
        }

        double Sine(int i, int j) => axes[i].Direction.Cross(axes[j].Direction).Norm;
        if (!(Sine(1, 2) <= tolerance) || !(Sine(0, 1) > Degenerate) || !(Sine(3, 4) > Degenerate) || !(Sine(4, 5) > Degenerate))
        {
            return null;
        }

        var centre = CommonPoint(axes[3], axes[4], axes[5]);
        return axes[3..].All(a => a.DistanceTo(centre) <= tolerance)
            && axes[1].DistanceTo(axes[2].Point) > Degenerate
            && axes[2].DistanceTo(centre) > Degenerate
                ? new(joints, axes, X_Bi * flangeInLastJoint, centre)
                : null;
    }

    /// <summary>
    /// All branches that put the flange at X_BF, as controller's joint values, not wrapped; up to eight.
    /// </summary>
    /// <param name="free">Joint values to keep where the pose leaves a joint undetermined (wrist straight, wrist centre on axis 1).</param>
    public List<double[]> Solve(RigidTransform flange, ReadOnlySpan<double> free)
    {
        const double ReachSlack = 1e-9; // m; a fully stretched arm is at the edge of its reach to rounding
        var found = new List<double[]>(8);
        var target = flange * flangeAtZeroInverse;
        var p = target * wristCentre;
        Span<double> first = stackalloc double[2];
        Span<double> third = stackalloc double[2];
        Span<double> fifth = stackalloc double[2];
        Span<double> theta = stackalloc double[6];

        var firstCount = SolveFirst(p, MotionOf(0, free), ReachSlack, first);
        for (var a = 0; a < firstCount; a++)
        {
            theta[0] = first[a];
            var p1 = axes[0].Move(-theta[0], p);
            var thirdCount = SolveThird(p1, ReachSlack, third);
            for (var b = 0; b < thirdCount; b++)
            {
                theta[2] = third[b];
                theta[1] = axes[1].AngleBetween(axes[2].Move(theta[2], wristCentre) - axes[1].Point, p1 - axes[1].Point);

                var arm = axes[0].Rotation(theta[0]) * axes[1].Rotation(theta[1]) * axes[2].Rotation(theta[2]);
                var wrist = arm.Transposed() * target.Rotation;
                var fifthCount = SolveFifth(wrist, fifth);
                for (var c = 0; c < fifthCount; c++)
                {
                    theta[4] = fifth[c];
                    theta[3] = SolveFourth(wrist, theta[4], MotionOf(3, free));
                    theta[5] = SolveSixth(wrist, theta[3], theta[4]);
                    found.Add(ToJoints(theta));
                }
            }
        }

        return found;
    }

    // Turning about the parallel axes 2 and 3 keeps the wrist centre's distance along them: n₂·(e₁⁻¹p − c) = 0.
    private int SolveFirst(Vector3D p, double free, double slack, Span<double> solutions)
    {
        var (n1, o1) = axes[0];
        var n2 = axes[1].Direction;
        var v = p - o1;
        var along = n1.Dot(v) * n1;
        var (a, b) = (n2.Dot(v - along), -n2.Dot(n1.Cross(v)));
        var c = n2.Dot(wristCentre - o1) - n2.Dot(along);
        if (Math.Sqrt(a * a + b * b) <= slack && Math.Abs(c) <= slack)
        {
            solutions[0] = free;
            return 1;
        }

        return TrigEquation.Solve(a, b, c, slack, solutions);
    }

    // e₂ keeps the distance from axis 2: |e₃c − o₂| = |p₁ − o₂| across the axis.
    private int SolveThird(Vector3D p1, double slack, Span<double> solutions)
    {
        var (n2, o2) = axes[1];
        var (n3, o3) = axes[2];
        var w = Across(o3 - o2, n2);
        var u = Across(wristCentre - o3, n3);
        var reach = Across(p1 - o2, n2);

        // |w + R₃u|² = |reach|²; the slack on a length becomes one on its square.
        return TrigEquation.Solve(
            2 * w.Dot(u),
            2 * w.Dot(n3.Cross(u)),
            reach.Dot(reach) - w.Dot(w) - u.Dot(u),
            2 * slack * (w.Norm + u.Norm),
            solutions);
    }

    // The angle between axes 4 and 6 depends on joint 5 alone: n₄·R₅n₆ = n₄·W n₆.
    private int SolveFifth(RotationMatrix wrist, Span<double> solutions)
    {
        const double DirectionSlack = 1e-12; // a cosine, exact to rounding
        var n4 = axes[3].Direction;
        var n5 = axes[4].Direction;
        var n6 = axes[5].Direction;
        var along = n5.Dot(n6) * n5;
        return TrigEquation.Solve(
            n4.Dot(n6 - along), n4.Dot(n5.Cross(n6)), n4.Dot(wrist * n6) - n4.Dot(along), DirectionSlack, solutions);
    }

    private double SolveFourth(RotationMatrix wrist, double fifth, double free)
    {
        var (from, to) = (axes[4].Turn(fifth, axes[5].Direction), wrist * axes[5].Direction);

        // Axis 6 along axis 4: only the sum of the two turns is determined.
        return Across(from, axes[3].Direction).Norm > Degenerate ? axes[3].AngleBetween(from, to) : free;
    }

    private double SolveSixth(RotationMatrix wrist, double fourth, double fifth)
    {
        var n6 = axes[5].Direction;
        var side = ToolAxisFrame.FromAxis(n6).AxisX;
        var rest = (axes[3].Rotation(fourth) * axes[4].Rotation(fifth)).Transposed() * wrist;
        return axes[5].AngleBetween(side, rest * side);
    }

    private double MotionOf(int joint, ReadOnlySpan<double> values) => joints[joint].Sign * values[joint] + joints[joint].Zero;

    private double[] ToJoints(ReadOnlySpan<double> motions)
    {
        var values = new double[6];
        for (var i = 0; i < 6; i++)
        {
            values[i] = joints[i].Sign * (motions[i] - joints[i].Zero);
        }

        return values;
    }

    private static Vector3D Across(Vector3D v, Vector3D direction) => v - direction.Dot(v) * direction;

    // The point nearest to three lines: Σ(I − nnᵀ)(c − o) = 0, by Cramer's rule on the columns.
    private static Vector3D CommonPoint(ScrewAxis a, ScrewAxis b, ScrewAxis c)
    {
        Vector3D Column(Vector3D unit) =>
            Across(unit, a.Direction) + Across(unit, b.Direction) + Across(unit, c.Direction);
        var (x, y, z) = (Column(Vector3D.UnitX), Column(Vector3D.UnitY), Column(Vector3D.UnitZ));
        var right = Across(a.Point, a.Direction) + Across(b.Point, b.Direction) + Across(c.Point, c.Direction);
        var determinant = x.Dot(y.Cross(z));
        return new(right.Dot(y.Cross(z)) / determinant, x.Dot(right.Cross(z)) / determinant, x.Dot(y.Cross(right)) / determinant);
    }
}
