using System.Runtime.CompilerServices;

namespace PathPortal.Engine.Stepping;

/// <summary>
/// The constrained rows: scaled Jacobian Ĵ = diag(I/L, I) S J diag(ℓ) with the two right-hand sides, feedback K e and feedforward, scaled alike.
/// Rows 0..2 position in base axes; rows 3..5 the rotation vector in base axes for a pose; rows 3, 4 the swing about the tool's x and y for an axis
/// task; what is not constrained stays zero.
/// </summary>
internal static unsafe class TaskStage
{
    /// <param name="seen">The arm as the controller sees it.</param>
    [MethodImpl(MethodImplOptions.NoInlining)]
    public static void Run<T>(LoopSetup setup, LoopWorkspace<T> w, ArmFrames<T> seen)
        where T : unmanaged, ILane<T>
    {
        var n = setup.JointCount;
        for (var i = 0; i < n; i++)
        {
            Column(setup, w, seen, i);
        }

        RightHandSides(setup, w, seen, n);
    }

    /// <summary>Errors of the true arm at this instant: distance and angle.</summary>
    [MethodImpl(MethodImplOptions.NoInlining)]
    public static void TrueErrors<T>(LoopWorkspace<T> w)
        where T : unmanaged, ILane<T>
    {
        var x = w.ReferencePoint;
        var p = w.True.Point;
        var (dx, dy, dz) = (x[0] - p[0], x[1] - p[1], x[2] - p[2]);
        *w.TrueDistance = T.Sqrt(T.PlusProduct(dx, dx, T.PlusProduct(dy, dy, dz * dz)));
        *w.TrueTurn = Turn(w, w.True);
    }

    [MethodImpl(MethodImplOptions.NoInlining)]
    private static void Column<T>(LoopSetup setup, LoopWorkspace<T> w, ArmFrames<T> seen, int i)
        where T : unmanaged, ILane<T>
    {
        var columns = w.Columns;
        var entry = w.Task + i;
        var a = seen.Axis + 3 * i;
        if (setup.Prismatic[i])
        {
            // ℓ/L = 1 for the linear rows.
            (entry[0], entry[columns], entry[2 * columns]) = (a[0], a[1], a[2]);
            entry[3 * columns] = entry[4 * columns] = entry[5 * columns] = T.Of(0);
            return;
        }

        var p = seen.Point;
        var o = seen.Origin + 3 * i;
        var (rx, ry, rz) = (p[0] - o[0], p[1] - o[1], p[2] - o[2]);
        var inverse = T.Of(1 / setup.Length);
        entry[0] = inverse * T.LessProduct(a[2], ry, a[1] * rz);
        entry[columns] = inverse * T.LessProduct(a[0], rz, a[2] * rx);
        entry[2 * columns] = inverse * T.LessProduct(a[1], rx, a[0] * ry);
        WriteTurnRows(w, seen, entry, a);
    }

    // A rotation vector in base axes, as the task's rows want it.
    [MethodImpl(MethodImplOptions.NoInlining)]
    private static void WriteTurnRows<T>(LoopWorkspace<T> w, ArmFrames<T> seen, T* entry, T* vector)
        where T : unmanaged, ILane<T>
    {
        var columns = w.Columns;
        var R = seen.Rotation;
        var (x, y, z) = (vector[0], vector[1], vector[2]);
        var aboutX = T.PlusProduct(R[0], x, T.PlusProduct(R[3], y, R[6] * z));
        var aboutY = T.PlusProduct(R[1], x, T.PlusProduct(R[4], y, R[7] * z));
        var (axis, turn) = (*w.AxisTask, *w.TurnRows);
        entry[3 * columns] = turn & T.Select(axis, aboutX, x);
        entry[4 * columns] = turn & T.Select(axis, aboutY, y);
        entry[5 * columns] = turn & T.Select(axis, T.Of(0), z);
    }

    [MethodImpl(MethodImplOptions.NoInlining)]
    private static void RightHandSides<T>(LoopSetup setup, LoopWorkspace<T> w, ArmFrames<T> seen, int n)
        where T : unmanaged, ILane<T>
    {
        var columns = w.Columns;
        var feedback = w.Task + n;
        var forward = w.Task + n + 1;
        var x = w.ReferencePoint;
        var p = seen.Point;
        var gain = T.Of(setup.Controller.PositionGain / setup.Length);
        var inverse = T.Of(1 / setup.Length);
        for (var row = 0; row < 3; row++)
        {
            feedback[row * columns] = gain * (x[row] - p[row]);
            forward[row * columns] = inverse * w.ForwardLinear[row];
        }

        Turn(w, seen);
        gain = T.Of(setup.Controller.OrientationGain);
        for (var row = 0; row < 3; row++)
        {
            feedback[(3 + row) * columns] = *w.TurnRows & (gain * w.TurnError[row]);
        }

        WriteTurnRows(w, seen, forward, w.ForwardTurn);
    }

    // Orientation error by task into TurnError; its angle. Each kind is computed only where a lane wants it.
    private static T Turn<T>(LoopWorkspace<T> w, ArmFrames<T> frames)
        where T : unmanaged, ILane<T>
    {
        var error = w.TurnError;
        var angle = T.Of(0);
        error[0] = error[1] = error[2] = T.Of(0);
        var (axis, turn) = (*w.AxisTask, *w.TurnRows);
        if (T.Any(turn & ~axis))
        {
            angle = T.Select(axis, angle, TurnErrors.Pose(w.ReferenceRotation, frames.Rotation, error));
        }

        if (T.Any(turn & axis))
        {
            var swing = stackalloc T[3];
            angle = T.Select(axis, TurnErrors.Swing(w.ReferenceRotation, frames.Rotation, swing), angle);
            for (var row = 0; row < 3; row++)
            {
                error[row] = T.Select(axis, swing[row], error[row]);
            }
        }

        return turn & angle;
    }
}
