using PathPortal.Engine.Stepping;

namespace PathPortal.Engine.Geometry;

/// <summary>
/// Elementary functions that give the same bits on every x64 machine. Nothing that feeds a run may take them from <see cref="Math"/>, whose
/// results depend on the platform's library; its square root, fused multiply-add and rounding are exact and may be used. Angles in radians.
/// Pure; safe from any thread.
/// </summary>
public static class Deterministic
{
    private const double Ln2High = 0.6931471805599453;
    private const double Ln2Low = 2.3190468138462996e-17;
    private const double OneByLn2 = 1.4426950408889634;

    /// <summary>Sine and cosine; NaN beyond 2³⁰ rad and for NaN.</summary>
    public static (double Sin, double Cos) SinCos(double angle)
    {
        LaneMath.SinCos(ScalarLane.Of(angle), out var sin, out var cos);
        return (sin.V, cos.V);
    }

    public static double Sin(double angle) => SinCos(angle).Sin;

    public static double Cos(double angle) => SinCos(angle).Cos;

    /// <summary>The angle of (x, y), in [−π, π]; (0, 0) gives 0 or ±π by the signs of the zeros. NaN for NaN and infinities.</summary>
    public static double Atan2(double y, double x) => LaneMath.Atan2(ScalarLane.Of(y), ScalarLane.Of(x)).V;

    /// <summary>In [0, π]; NaN outside [−1, 1].</summary>
    public static double Acos(double cosine) => Atan2(Math.Sqrt((1 - cosine) * (1 + cosine)), cosine);

    /// <summary>In [−π/2, π/2]; NaN outside [−1, 1].</summary>
    public static double Asin(double sine) => Atan2(sine, Math.Sqrt((1 - sine) * (1 + sine)));

    /// <summary>eˣ; 0 and +∞ beyond the range of a double.</summary>
    public static double Exp(double x)
    {
        if (!(x > -745.2))
        {
            return x < 0 ? 0 : double.NaN;
        }

        if (x > 709.8)
        {
            return double.PositiveInfinity;
        }

        // x = k ln 2 + r, |r| ≤ 0.35; the next Taylor term is below 5e-18.
        var k = Math.Round(x * OneByLn2);
        var r = Math.FusedMultiplyAdd(-k, Ln2High, x);
        r = Math.FusedMultiplyAdd(-k, Ln2Low, r);
        var sum = 1.0 / 6227020800;
        ReadOnlySpan<double> factorials = [479001600, 39916800, 3628800, 362880, 40320, 5040, 720, 120, 24, 6, 2, 1, 1];
        foreach (var factorial in factorials)
        {
            sum = Math.FusedMultiplyAdd(r, sum, 1 / factorial);
        }

        return Math.ScaleB(sum, (int)k);
    }

    /// <summary>Natural logarithm; −∞ at 0, NaN below.</summary>
    public static double Log(double x)
    {
        if (!(x > 0) || double.IsPositiveInfinity(x))
        {
            return x == 0 ? double.NegativeInfinity : x > 0 ? x : double.NaN;
        }

        // x = m 2ᵉ with m near 1; log m = 2 artanh((m − 1)/(m + 1)).
        var e = Math.ILogB(x);
        var m = Math.ScaleB(x, -e);
        if (m > 1.4142135623730951)
        {
            m /= 2;
            e++;
        }

        var f = (m - 1) / (m + 1);
        return Math.FusedMultiplyAdd(e, Ln2High, Math.FusedMultiplyAdd(e, Ln2Low, 2 * ArtanhSmall(f)));
    }

    /// <summary>The inverse of sinh.</summary>
    public static double Asinh(double x)
    {
        var t = x / Math.Sqrt(1 + x * x);
        return Math.Abs(t) < 0.17 ? ArtanhSmall(t) : Math.CopySign(Log(Math.Abs(x) + Math.Sqrt(1 + x * x)), x);
    }

    // f + f³/3 + f⁵/5 + … for |f| ≤ 0.1716; the next term is below 1e-18.
    private static double ArtanhSmall(double f)
    {
        var z = f * f;
        var sum = 1.0 / 23;
        for (var odd = 21; odd >= 3; odd -= 2)
        {
            sum = Math.FusedMultiplyAdd(z, sum, 1.0 / odd);
        }

        return Math.FusedMultiplyAdd(z * f, sum, f);
    }
}
