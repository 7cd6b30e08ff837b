namespace PathPortal.Engine.Postures;

/// <summary>x = Jᵀ(JJᵀ + λ²I)⁻¹u = (JᵀJ + λ²I)⁻¹Jᵀu for small dense J, whichever system is smaller, by Cholesky's factorisation.</summary>
internal static class DampedLeastSquares
{
    private const int MaxSize = 8;

    /// <summary>Solves; false when the system is not positive definite to rounding or not finite.</summary>
    /// <param name="J">m × n, row-major.</param>
    /// <param name="damping">λ², zero or more.</param>
    public static bool Solve(ReadOnlySpan<double> J, int m, int n, double damping, ReadOnlySpan<double> u, Span<double> x)
    {
        Span<double> A = stackalloc double[MaxSize * MaxSize];
        Span<double> y = stackalloc double[MaxSize];
        if (m <= n)
        {
            for (var i = 0; i < m; i++)
            {
                y[i] = u[i];
                for (var j = 0; j <= i; j++)
                {
                    var sum = i == j ? damping : 0;
                    for (var k = 0; k < n; k++)
                    {
                        sum += J[i * n + k] * J[j * n + k];
                    }

                    A[i * MaxSize + j] = sum;
                }
            }

            if (!SolvePositive(A, y, m))
            {
                return false;
            }

            for (var k = 0; k < n; k++)
            {
                x[k] = 0;
                for (var i = 0; i < m; i++)
                {
                    x[k] += J[i * n + k] * y[i];
                }
            }

            return true;
        }

        for (var i = 0; i < n; i++)
        {
            x[i] = 0;
            for (var k = 0; k < m; k++)
            {
                x[i] += J[k * n + i] * u[k];
            }

            for (var j = 0; j <= i; j++)
            {
                var sum = i == j ? damping : 0;
                for (var k = 0; k < m; k++)
                {
                    sum += J[k * n + i] * J[k * n + j];
                }

                A[i * MaxSize + j] = sum;
            }
        }

        return SolvePositive(A, x, n);
    }

    // A = CCᵀ in the lower triangle, then C z = b, Cᵀ x = z, in place.
    private static bool SolvePositive(Span<double> A, Span<double> b, int size)
    {
        for (var i = 0; i < size; i++)
        {
            for (var j = 0; j <= i; j++)
            {
                var sum = A[i * MaxSize + j];
                for (var k = 0; k < j; k++)
                {
                    sum -= A[i * MaxSize + k] * A[j * MaxSize + k];
                }

                if (i == j)
                {
                    if (!(sum > 0) || !double.IsFinite(sum))
                    {
                        return false;
                    }

                    A[i * MaxSize + i] = Math.Sqrt(sum);
                }
                else
                {
                    A[i * MaxSize + j] = sum / A[j * MaxSize + j];
                }
            }
        }

        for (var i = 0; i < size; i++)
        {
            for (var k = 0; k < i; k++)
            {
                b[i] -= A[i * MaxSize + k] * b[k];
            }

            b[i] /= A[i * MaxSize + i];
        }

        for (var i = size - 1; i >= 0; i--)
        {
            for (var k = i + 1; k < size; k++)
            {
                b[i] -= A[k * MaxSize + i] * b[k];
            }

            b[i] /= A[i * MaxSize + i];
        }

        return true;
    }
}
