using System.Collections.Immutable;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;

namespace PathPortal.Engine.Postures;

/// <summary>
/// Inverse kinematics of one arm with one tool. Closed form where the arm allows it (axes 2 and 3 parallel, axes 4 to 6 through one point within
/// 1e-9; also behind a track), finished by Newton; Newton from evenly spread starts otherwise. Deterministic. Immutable; safe between threads.
/// </summary>
public sealed class PostureFinder
{
    /// <summary>Largest departure from parallel (rad) and from one common point (m) at which the closed form counts as exact.</summary>
    public const double ClosedFormTolerance = 1e-9;

    private readonly ArmModel arm;
    private readonly RigidTransform toolInFlange;
    private readonly NewtonSolver newton;
    private readonly BranchSource branches;

    /// <param name="toolInFlange">X_FT.</param>
    public PostureFinder(ArmModel arm, RigidTransform toolInFlange)
    {
        ArgumentNullException.ThrowIfNull(arm);
        this.arm = arm;
        this.toolInFlange = toolInFlange;
        newton = new(arm, toolInFlange);
        branches = BranchSource.For(arm, toolInFlange);
    }

    /// <summary>True where all branches come from a closed form; false where a search may miss one.</summary>
    public bool ClosedForm => branches.IsClosedForm;

    /// <summary>
    /// Every posture found that puts the tool at X_BT within 1e-9 m and rad, in the rows the task constrains. An arm with more joints than rows
    /// has endless postures; then a spread of them.
    /// </summary>
    public PostureSet All(RigidTransform toolInBase, TaskKind task = TaskKind.Pose)
    {
        var inside = ImmutableArray.CreateBuilder<Posture>();
        var outside = ImmutableArray.CreateBuilder<Posture>();
        foreach (var branch in branches.Find(task, toolInBase))
        {
            var turned = TurnsInside(branch.Joints);
            inside.AddRange(turned.Select(joints => new Posture(joints, TurnWords.Add(branch.Description, arm, joints))));
            if (turned.IsEmpty)
            {
                outside.Add(branch);
            }
        }

        return new(inside.ToImmutable(), outside.ToImmutable());
    }

    /// <summary>
    /// The posture that puts the tool at X_BT nearest to given joint values, inside the position limits; null when there is none. Near means
    /// quickly reached: the largest joint travel, divided by the joint's speed limit where every joint has one.
    /// </summary>
    /// <param name="seed">Controller's joint values to stay close to.</param>
    public ImmutableArray<double>? Nearest(RigidTransform toolInBase, ReadOnlySpan<double> seed, TaskKind task = TaskKind.Pose)
    {
        var (best, bestTravel) = ((double[]?)null, double.PositiveInfinity);
        void Consider(IReadOnlyList<double> joints, ReadOnlySpan<double> from)
        {
            if (NearestTurns(joints, from) is { } turned && Travel(turned, from) is var travel && travel < bestTravel)
            {
                (best, bestTravel) = (turned, travel);
            }
        }

        if (Continue(toolInBase, seed, task) is { } continued)
        {
            Consider(continued, seed);
        }

        // A search over starts costs far more than it can gain once the seed itself has led to a posture.
        if (branches.IsClosedForm || best is null)
        {
            foreach (var branch in branches.Find(task, toolInBase, seed))
            {
                Consider(branch.Joints, seed);
            }
        }

        return best is null ? null : [.. best];
    }

    /// <summary>
    /// The posture Newton's method reaches from a seed, without regard to limits: continuation along a path. Null when it reaches none.
    /// </summary>
    public ImmutableArray<double>? Continue(RigidTransform toolInBase, ReadOnlySpan<double> seed, TaskKind task = TaskKind.Pose)
    {
        var joints = seed.ToArray();
        return newton.Solve(task, toolInBase, joints) ? [.. joints] : null;
    }

    private double[]? NearestTurns(IReadOnlyList<double> joints, ReadOnlySpan<double> seed)
    {
        var turned = new double[joints.Count];
        for (var i = 0; i < turned.Length; i++)
        {
            if (JointTurns.Nearest(arm.Joints[i], joints[i], seed[i]) is not { } value)
            {
                return null;
            }

            turned[i] = value;
        }

        return turned;
    }

    private double Travel(double[] joints, ReadOnlySpan<double> seed)
    {
        var bySpeed = arm.Joints.All(j => j.Limits.Speed is { Value: > 0 });
        var (largest, sum) = (0.0, 0.0);
        for (var i = 0; i < joints.Length; i++)
        {
            var unit = bySpeed ? arm.Joints[i].Limits.Speed!.Value.Value
                : arm.Joints[i].Kind == JointKind.Prismatic ? arm.CharacteristicLength : 1;
            var travel = Math.Abs(joints[i] - seed[i]) / unit;
            largest = Math.Max(largest, travel);
            sum += travel;
        }

        // The sum decides only between postures that are equally far by their slowest joint.
        return largest + 1e-6 * sum;
    }

    // Every combination of the values each joint may take, first joint slowest.
    private ImmutableArray<ImmutableArray<double>> TurnsInside(ImmutableArray<double> joints)
    {
        List<ImmutableArray<double>> combinations = [[]];
        for (var i = 0; i < joints.Length; i++)
        {
            var values = JointTurns.Inside(arm.Joints[i], joints[i]);
            combinations = [.. combinations.SelectMany(_ => values, (head, value) => head.Add(value))];
        }

        return [.. combinations];
    }
}
