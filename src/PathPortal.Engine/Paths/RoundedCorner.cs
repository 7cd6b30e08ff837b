using PathPortal.Engine.Geometry;

namespace PathPortal.Engine.Paths;

/// <summary>
/// A corner rounded by the parabola that leaves the straight before and meets the straight after at the same reach d from the corner, tangent to
/// both. With w from −1 to 1 along it and half the change of direction φ, speed by w is d r, r = √(cos²φ + sin²φ w²); its arc length is closed,
/// its sharpest place is the middle, and it passes the corner at (d/2) sin φ. Immutable.
/// </summary>
internal readonly struct RoundedCorner
{
    private readonly Vector3D corner;
    private readonly Vector3D before;
    private readonly Vector3D after;
    private readonly double reach;
    private readonly double cos;
    private readonly double sin;

    /// <param name="before">Unit vector of the straight into the corner.</param>
    /// <param name="after">Unit vector of the straight out of it.</param>
    /// <param name="reach">d (m), above zero.</param>
    public RoundedCorner(Vector3D corner, Vector3D before, Vector3D after, double reach)
    {
        (this.corner, this.before, this.after, this.reach) = (corner, before, after, reach);
        (sin, cos) = (0.5 * (after - before).Norm, 0.5 * (after + before).Norm);
        HalfLength = ArcTo(1);
    }

    /// <summary>Arc length from the middle to either end (m).</summary>
    public double HalfLength { get; }

    /// <summary>Cosine of half the change of direction; the least of r.</summary>
    public double CosHalfTurn => cos;

    /// <summary>Smallest radius of curvature (m), d cos²φ / sin φ; infinite where the corner is none.</summary>
    public double SmallestRadius => reach * cos * cos / sin;

    /// <summary>Share u in [0, 1] of the parabola's own parameter, and du/ds (1/m), at arc length s from its begin (m).</summary>
    public (double U, double Rate) ShareAt(double s)
    {
        // Odd and convex in w: from the chord Newton lands beyond the root once and then closes in on it from there.
        var target = s - HalfLength;
        var size = Math.Min(Math.Abs(target), HalfLength);
        var w = size / HalfLength;
        for (var k = 0; k < 12; k++)
        {
            var step = (size - ArcTo(w)) / (reach * Radius(w));
            w += step;
            if (Math.Abs(step) < 1e-16)
            {
                break;
            }
        }

        return (0.5 * (1 + Math.CopySign(Math.Min(w, 1), target)), 1 / (2 * reach * Radius(w)));
    }

    /// <summary>The point at share u (m).</summary>
    public Vector3D At(double u) => corner - reach * (1 - u) * (1 - u) * before + reach * u * u * after;

    /// <summary>dp/du (m).</summary>
    public Vector3D Derivative(double u) => 2 * reach * ((1 - u) * before + u * after);

    private double Radius(double w) => Math.Sqrt(cos * cos + sin * sin * w * w);

    // ∫₀ʷ d r dw = (d/2)(w r + (cos²φ/sin φ) arsinh(w tan φ)); arsinh(x)/x holds where φ goes to zero.
    private double ArcTo(double w)
    {
        var x = sin * w / cos;
        var ratio = x < 1e-8 ? 1 : Deterministic.Asinh(x) / x;
        return 0.5 * reach * w * (Radius(w) + cos * ratio);
    }
}
