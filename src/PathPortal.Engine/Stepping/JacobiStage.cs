using System.Runtime.CompilerServices;

namespace PathPortal.Engine.Stepping;

/// <summary>
/// Singular values by one-sided Jacobi rotations (Hestenes 1958): pairs of rows of Ĵ are turned in their plane until all are orthogonal. Then
/// row r is σ_r v_rᵀ, and the right-hand sides, turned along as columns of their own, are Uᵀu: everything a damped inverse needs. Works on Ĵ itself,
/// not on ĴĴᵀ, so that small singular values keep their digits (Demmel and Veselić 1992); has no state from step to step; a zero row stays as it is.
/// </summary>
internal static unsafe class JacobiStage
{
    // Rows whose cosine is below this are orthogonal to rounding.
    private const double Orthogonal = 1e-15;

    // Quadratic convergence needs four to six sweeps; lanes with values that are not finite never ask for one.
    private const int MostSweeps = 12;

    [MethodImpl(MethodImplOptions.NoInlining)]
    public static void Run<T>(LoopSetup setup, LoopWorkspace<T> w)
        where T : unmanaged, ILane<T>
    {
        var n = setup.JointCount;
        var columns = w.Columns;
        var rows = w.Task;
        for (var sweep = 0; sweep < MostSweeps; sweep++)
        {
            // Five rounds of three pairs that share no row: every pair once.
            var turned = T.Of(0);
            for (var round = 0; round < 5; round++)
            {
                var (a, b) = (round, (round + 1) % 5);
                var (c, d) = ((round + 4) % 5, (round + 2) % 5);
                var e = (round + 3) % 5;
                turned |= Rotate(rows + columns * b, rows + columns * c, n, columns);
                turned |= Rotate(rows + columns * d, rows + columns * e, n, columns);
                turned |= Rotate(rows + columns * a, rows + columns * 5, n, columns);
            }

            if (!T.Any(turned))
            {
                break;
            }
        }

        for (var row = 0; row < LoopWorkspace<T>.Rows; row++)
        {
            w.SigmaSquared[row] = Dot(rows + row * columns, rows + row * columns, n);
        }
    }

    // Turns rows p and q until they are orthogonal; the mask of the lanes that were turned.
    [MethodImpl(MethodImplOptions.NoInlining)]
    private static T Rotate<T>(T* p, T* q, int n, int columns)
        where T : unmanaged, ILane<T>
    {
        var alpha = p[0] * p[0];
        var beta = q[0] * q[0];
        var gamma = p[0] * q[0];
        for (var i = 1; i < n; i++)
        {
            alpha = T.PlusProduct(p[i], p[i], alpha);
            beta = T.PlusProduct(q[i], q[i], beta);
            gamma = T.PlusProduct(p[i], q[i], gamma);
        }

        var turn = gamma * gamma > T.Of(Orthogonal * Orthogonal) * (alpha * beta);
        if (!T.Any(turn))
        {
            return turn;
        }

        // The smaller root of t² + 2ζt − 1 = 0, ζ = (β − α)/2γ.
        var delta = beta - alpha;
        var twice = gamma + gamma;
        var root = T.Sqrt(T.PlusProduct(delta, delta, twice * twice));
        var tan = twice / (delta + T.CopySign(root, delta));
        var cos = T.Of(1) / T.Sqrt(T.PlusProduct(tan, tan, T.Of(1)));
        var sin = tan * cos;
        for (var i = 0; i < columns; i++)
        {
            var (x, y) = (p[i], q[i]);
            p[i] = T.Select(turn, T.LessProduct(sin, y, cos * x), x);
            q[i] = T.Select(turn, T.PlusProduct(sin, x, cos * y), y);
        }

        return turn;
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static T Dot<T>(T* p, T* q, int n)
        where T : unmanaged, ILane<T>
    {
        var sum = p[0] * q[0];
        for (var i = 1; i < n; i++)
        {
            sum = T.PlusProduct(p[i], q[i], sum);
        }

        return sum;
    }
}
