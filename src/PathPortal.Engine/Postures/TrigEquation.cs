using PathPortal.Engine.Geometry;

namespace PathPortal.Engine.Postures;

/// <summary>The equation a cos θ + b sin θ = c.</summary>
internal static class TrigEquation
{
    /// <summary>
    /// Writes the solutions θ (rad, not wrapped) and returns their number: 2, 1 where both fall together, or 0. A right-hand side beyond the
    /// reach √(a² + b²) by at most <paramref name="slack"/> counts as exactly at it.
    /// </summary>
    public static int Solve(double a, double b, double c, double slack, Span<double> solutions)
    {
        var reach = Math.Sqrt(a * a + b * b);
        if (!(Math.Abs(c) <= reach + slack))
        {
            return 0;
        }

        var middle = Deterministic.Atan2(b, a);
        var square = reach * reach - c * c;
        if (!(square > 0))
        {
            solutions[0] = c > 0 ? middle : middle + Math.PI;
            return 1;
        }

        var spread = Deterministic.Atan2(Math.Sqrt(square), c);
        solutions[0] = middle + spread;
        solutions[1] = middle - spread;
        return 2;
    }
}
