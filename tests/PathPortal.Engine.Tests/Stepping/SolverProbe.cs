using PathPortal.Engine.Arms;
using PathPortal.Engine.Control;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Stepping;
using PathPortal.Engine.Tests.Control;

namespace PathPortal.Engine.Tests.Stepping;

/// <summary>The kernel's solver on a given matrix, without an arm around it: rows, right-hand side in, joint speeds and singular values out.</summary>
internal static unsafe class SolverProbe
{
    /// <param name="matrix">3, 5 or 6 rows.</param>
    public static (double[] Speeds, double SigmaMin, double SigmaMax, double DampingSquared) Solve(
        double[][] matrix, double[] twist, Damping damping, double midRangeGain = 0, double[]? joints = null, JointLimits? limits = null)
    {
        var n = matrix[0].Length;
        var controller = LoopScenarios.Controller with { Damping = damping, MidRangeGain = midRangeGain };
        var setup = new LoopSetup(Arm(n, limits ?? new()), RigidTransform.Identity, controller);
        var w = new LoopWorkspace<ScalarLane>(setup);
        for (var row = 0; row < matrix.Length; row++)
        {
            for (var i = 0; i < n; i++)
            {
                w.Task[row * w.Columns + i].V = matrix[row][i];
            }

            w.Task[row * w.Columns + n].V = twist[row];
        }

        LoopWorkspace<ScalarLane>.SetMask(w.TurnRows, 0, matrix.Length > 3);
        LoopWorkspace<ScalarLane>.SetMask(w.AxisTask, 0, matrix.Length == 5);
        for (var i = 0; i < n; i++)
        {
            w.Joints[i].V = joints?[i] ?? 0;
        }

        JacobiStage.Run(setup, w);
        SolveStage.Run(setup, w, w.Joints);
        return ([.. Enumerable.Range(0, n).Select(i => w.Feedback[i].V)], w.SigmaMin->V, w.SigmaMax->V, w.DampingSquared->V);
    }

    private static ArmModel Arm(int joints, JointLimits limits) => TestArms.Planar(new double[joints]) is var arm
        ? arm with { Joints = [.. arm.Joints.Select(j => j with { Limits = limits })] }
        : throw new InvalidOperationException();
}
