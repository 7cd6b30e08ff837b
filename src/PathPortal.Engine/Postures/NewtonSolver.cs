using PathPortal.Engine.Arms;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;

namespace PathPortal.Engine.Postures;

/// <summary>
/// Newton's method on the task's pose error with Levenberg–Marquardt damping λ² = |ê|² + floor (Sugihara 2011): far away and near singular postures
/// it takes careful steps, close to a regular solution it converges quadratically. Works on the scaled Jacobian. Immutable; safe between threads.
/// </summary>
internal sealed class NewtonSolver(ArmModel arm, RigidTransform toolInFlange)
{
    /// <summary>A posture whose error is at most this (m and rad) reaches the pose: a micrometre's thousandth, far above rounding.</summary>
    public const double Tolerance = 1e-9;

    // Below this (m and rad) rounding of the forward kinematics leads; more steps change nothing.
    private const double Floor = 1e-14;
    private const double DampingFloor = 1e-14;
    private const double LargestStep = 0.5; // rad, or of L for prismatic joints
    private const int MostSteps = 100;

    /// <summary>Moves <paramref name="joints"/> to the nearest solution found; false, with the best joints reached, where there is none.</summary>
    public bool Solve(TaskKind task, RigidTransform goal, Span<double> joints)
    {
        var m = TaskRows.RowCount(task);
        var n = joints.Length;
        var L = arm.CharacteristicLength;
        Span<double> error = stackalloc double[6];
        Span<double> jacobian = stackalloc double[6 * ArmModel.MaxJoints];
        Span<double> step = stackalloc double[ArmModel.MaxJoints];
        Span<double> best = stackalloc double[ArmModel.MaxJoints];
        var bestSize = double.PositiveInfinity;
        var stalled = 0;
        joints.CopyTo(best);

        for (var k = 0; k < MostSteps; k++)
        {
            var pose = ArmPose.Compute(arm, joints);
            var tool = pose.Tool(toolInFlange);
            TaskRows.Write(task, tool, goal, error);
            var size = Largest(error[..m]);
            if (size < bestSize)
            {
                (bestSize, stalled) = (size, 0);
                joints.CopyTo(best);
            }
            else if (!double.IsFinite(size) || (bestSize <= Tolerance && ++stalled > 2))
            {
                break;
            }

            if (size <= Floor)
            {
                break;
            }

            TaskRows.WriteJacobian(task, GeometricJacobian.Compute(arm, pose, tool.Translation), tool.Rotation, jacobian);
            TaskRows.ScaleJacobian(arm, jacobian[..(m * n)]);
            TaskRows.ScaleError(arm, error[..m]);
            var damping = DampingFloor + SquareOf(error[..m]);
            if (!DampedLeastSquares.Solve(jacobian[..(m * n)], m, n, damping, error[..m], step[..n]))
            {
                break;
            }

            var cut = Math.Min(1, LargestStep / Largest(step[..n]));
            for (var i = 0; i < n; i++)
            {
                joints[i] += cut * step[i] * (arm.Joints[i].Kind == JointKind.Prismatic ? L : 1);
            }
        }

        best[..n].CopyTo(joints);
        return bestSize <= Tolerance;
    }

    private static double Largest(ReadOnlySpan<double> values)
    {
        var largest = 0.0;
        foreach (var value in values)
        {
            // Written so that NaN is kept.
            largest = Math.Abs(value) <= largest ? largest : Math.Abs(value);
        }

        return largest;
    }

    private static double SquareOf(ReadOnlySpan<double> values)
    {
        var sum = 0.0;
        foreach (var value in values)
        {
            sum += value * value;
        }

        return sum;
    }
}
