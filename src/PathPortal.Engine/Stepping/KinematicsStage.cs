using System.Runtime.CompilerServices;

namespace PathPortal.Engine.Stepping;

/// <summary>Forward kinematics: X_BT = A₁ M₁(q₁) … A_n M_n(q_n) X_NT, M a turn about or a slide along z, with each joint's axis on the way.</summary>
internal static unsafe class KinematicsStage
{
    [MethodImpl(MethodImplOptions.NoInlining)]
    public static void Run<T>(LoopSetup setup, T* joints, ArmFrames<T> frames)
        where T : unmanaged, ILane<T>
    {
        var R = frames.Rotation;
        var p = frames.Point;
        for (var i = 0; i < 9; i++)
        {
            R[i] = T.Of(i % 4 == 0 ? 1 : 0);
        }

        p[0] = p[1] = p[2] = T.Of(0);
        for (var i = 0; i < setup.JointCount; i++)
        {
            Attach(R, p, setup.LinkPoses, 12 * i);
            var sign = T.Of(setup.Sign[i]);
            var axis = frames.Axis + 3 * i;
            var origin = frames.Origin + 3 * i;
            for (var row = 0; row < 3; row++)
            {
                axis[row] = sign * R[3 * row + 2];
                origin[row] = p[row];
            }

            var motion = T.PlusProduct(sign, joints[i], T.Of(setup.Zero[i]));
            if (setup.Prismatic[i])
            {
                Slide(R, p, motion);
            }
            else
            {
                Turn(R, motion);
            }
        }

        Attach(R, p, setup.ToolInLastJoint, 0);
    }

    // X ← X A for a constant A.
    [MethodImpl(MethodImplOptions.NoInlining)]
    private static void Attach<T>(T* R, T* p, double[] pose, int at)
        where T : unmanaged, ILane<T>
    {
        fixed (double* A = &pose[at])
        {
            for (var row = 0; row < 3; row++)
            {
                var (x, y, z) = (R[3 * row], R[3 * row + 1], R[3 * row + 2]);
                p[row] = T.PlusProduct(x, T.Of(A[9]), T.PlusProduct(y, T.Of(A[10]), T.PlusProduct(z, T.Of(A[11]), p[row])));
                R[3 * row] = T.PlusProduct(x, T.Of(A[0]), T.PlusProduct(y, T.Of(A[3]), z * T.Of(A[6])));
                R[3 * row + 1] = T.PlusProduct(x, T.Of(A[1]), T.PlusProduct(y, T.Of(A[4]), z * T.Of(A[7])));
                R[3 * row + 2] = T.PlusProduct(x, T.Of(A[2]), T.PlusProduct(y, T.Of(A[5]), z * T.Of(A[8])));
            }
        }
    }

    [MethodImpl(MethodImplOptions.NoInlining)]
    private static void Turn<T>(T* R, T angle)
        where T : unmanaged, ILane<T>
    {
        LaneMath.SinCos(angle, out var sin, out var cos);
        for (var row = 0; row < 3; row++)
        {
            var (x, y) = (R[3 * row], R[3 * row + 1]);
            R[3 * row] = T.PlusProduct(cos, x, sin * y);
            R[3 * row + 1] = T.LessProduct(sin, x, cos * y);
        }
    }

    private static void Slide<T>(T* R, T* p, T distance)
        where T : unmanaged, ILane<T>
    {
        for (var row = 0; row < 3; row++)
        {
            p[row] = T.PlusProduct(distance, R[3 * row + 2], p[row]);
        }
    }
}
