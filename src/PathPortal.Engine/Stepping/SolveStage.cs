using System.Runtime.CompilerServices;
using PathPortal.Engine.Control;

namespace PathPortal.Engine.Stepping;

/// <summary>
/// Joint speeds from orthogonal rows r_i = σ_i v_iᵀ and turned right-hand sides u_i: q̇ = diag(ℓ) Σ r_i u_i/(σ_i² + λ²), which is
/// Ĵᵀ(ĴĴᵀ + λ²I)⁻¹û, and the null-space motion N q̇₀ = q̇₀ − Σ r_i (r_i·q̇₀)/(σ_i² + λ²).
/// </summary>
internal static unsafe class SolveStage
{
    [MethodImpl(MethodImplOptions.NoInlining)]
    public static void Run<T>(LoopSetup setup, LoopWorkspace<T> w, T* seen)
        where T : unmanaged, ILane<T>
    {
        SingularValues(setup, w);
        JointSpeeds(setup, w);
        if (setup.Controller.MidRangeGain != 0)
        {
            PullToMiddle(setup, w, seen);
        }

        JointMoves(setup, w, seen);
    }

    [MethodImpl(MethodImplOptions.NoInlining)]
    private static void SingularValues<T>(LoopSetup setup, LoopWorkspace<T> w)
        where T : unmanaged, ILane<T>
    {
        var squared = w.SigmaSquared;
        var smallest = T.Min(squared[0], T.Min(squared[1], squared[2]));
        var largest = T.Max(squared[0], T.Max(squared[1], squared[2]));
        var (turn, pose) = (*w.TurnRows, *w.TurnRows & ~*w.AxisTask);
        for (var row = 3; row < LoopWorkspace<T>.Rows; row++)
        {
            var constrained = row < 5 ? turn : pose;
            smallest = T.Select(constrained, T.Min(squared[row], smallest), smallest);
            largest = T.Select(constrained, T.Max(squared[row], largest), largest);
        }

        *w.SigmaMin = T.Sqrt(smallest);
        *w.SigmaMax = T.Sqrt(largest);
        var damping = setup.Controller.Damping;
        *w.DampingSquared = damping.Kind switch
        {
            DampingKind.Constant => T.Of(damping.Lambda * damping.Lambda),
            DampingKind.Variable => T.Of(damping.Lambda * damping.Lambda)
                * T.Max(T.LessProduct(smallest, T.Of(1 / (damping.Epsilon * damping.Epsilon)), T.Of(1)), T.Of(0)),
            _ => T.Of(0),
        };
        *w.Singular = damping.Kind == DampingKind.None
            ? ~*w.JointMode & ~(*w.SigmaMax <= T.Of(LoopSetup.LargestCondition) * *w.SigmaMin)
            : T.Of(0);

        for (var row = 0; row < LoopWorkspace<T>.Rows; row++)
        {
            // A row that constrains nothing, or a direction lost without damping, moves nothing.
            var weight = squared[row] + *w.DampingSquared;
            w.Weight[row] = (weight > T.Of(0)) & (T.Of(1) / weight);
        }
    }

    [MethodImpl(MethodImplOptions.NoInlining)]
    private static void JointSpeeds<T>(LoopSetup setup, LoopWorkspace<T> w)
        where T : unmanaged, ILane<T>
    {
        var (n, columns) = (setup.JointCount, w.Columns);
        var weights = stackalloc T[2 * LoopWorkspace<T>.Rows];
        for (var row = 0; row < LoopWorkspace<T>.Rows; row++)
        {
            weights[2 * row] = w.Weight[row] * w.Task[row * columns + n];
            weights[2 * row + 1] = w.Weight[row] * w.Task[row * columns + n + 1];
        }

        for (var i = 0; i < n; i++)
        {
            var (feedback, forward) = (T.Of(0), T.Of(0));
            for (var row = 0; row < LoopWorkspace<T>.Rows; row++)
            {
                feedback = T.PlusProduct(w.Task[row * columns + i], weights[2 * row], feedback);
                forward = T.PlusProduct(w.Task[row * columns + i], weights[2 * row + 1], forward);
            }

            var unit = T.Of(setup.Prismatic[i] ? setup.Length : 1);
            w.Feedback[i] = unit * feedback;
            w.Forward[i] = unit * forward;
        }
    }

    // q̇₀ = k₀ (middle − q), the steepest descent of half the squared distance from mid-range.
    [MethodImpl(MethodImplOptions.NoInlining)]
    private static void PullToMiddle<T>(LoopSetup setup, LoopWorkspace<T> w, T* seen)
        where T : unmanaged, ILane<T>
    {
        var n = setup.JointCount;
        var columns = w.Columns;
        var pull = w.Pull;
        for (var i = 0; i < n; i++)
        {
            var gain = setup.Controller.MidRangeGain / (setup.Prismatic[i] ? setup.Length : 1);
            pull[i] = double.IsNaN(setup.Middle[i]) ? T.Of(0) : T.Of(gain) * (T.Of(setup.Middle[i]) - seen[i]);
        }

        // All six from the pull as it was: the damped parts are no projectors and must not build on each other.
        var taken = stackalloc T[LoopWorkspace<T>.Rows];
        for (var row = 0; row < LoopWorkspace<T>.Rows; row++)
        {
            var along = T.Of(0);
            for (var i = 0; i < n; i++)
            {
                along = T.PlusProduct(w.Task[row * columns + i], pull[i], along);
            }

            taken[row] = along * w.Weight[row];
        }

        for (var i = 0; i < n; i++)
        {
            var free = pull[i];
            for (var row = 0; row < LoopWorkspace<T>.Rows; row++)
            {
                free = T.LessProduct(w.Task[row * columns + i], taken[row], free);
            }

            w.Feedback[i] = T.PlusProduct(T.Of(setup.Prismatic[i] ? setup.Length : 1), free, w.Feedback[i]);
        }
    }

    // On joint moves the loop closes joint by joint: q̇ = q̇_ref + K (q_ref − q).
    [MethodImpl(MethodImplOptions.NoInlining)]
    private static void JointMoves<T>(LoopSetup setup, LoopWorkspace<T> w, T* seen)
        where T : unmanaged, ILane<T>
    {
        var mode = *w.JointMode;
        if (!T.Any(mode))
        {
            return;
        }

        var gain = T.Of(setup.Controller.PositionGain);
        for (var i = 0; i < setup.JointCount; i++)
        {
            w.Feedback[i] = T.Select(mode, gain * (w.ReferenceJoints[i] - seen[i]), w.Feedback[i]);
            w.Forward[i] = T.Select(mode, w.ReferenceJointSpeeds[i], w.Forward[i]);
        }

        *w.SigmaMin = T.Select(mode, T.Of(double.NaN), *w.SigmaMin);
        *w.SigmaMax = T.Select(mode, T.Of(double.NaN), *w.SigmaMax);
        *w.DampingSquared = T.Select(mode, T.Of(0), *w.DampingSquared);
    }
}
