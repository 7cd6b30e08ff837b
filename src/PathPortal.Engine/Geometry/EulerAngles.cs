namespace PathPortal.Engine.Geometry;

/// <summary>Three angles (rad) of a rotation in a named convention, in the order the convention names its axes. Immutable.</summary>
public readonly record struct EulerAngles(EulerConvention Convention, double First, double Second, double Third)
{
    // Below this sine (or cosine) of the middle angle only a sum or a difference of the outer two is determined.
    private const double PoleBelow = 1e-10;

    /// <summary>The rotation these angles make.</summary>
    public RotationMatrix ToMatrix() => ToMatrix(
        Convention, Angle.FromRadians(First), Angle.FromRadians(Second), Angle.FromRadians(Third));

    /// <summary>The rotation of three angles; right angles written in degrees stay exact.</summary>
    public static RotationMatrix ToMatrix(EulerConvention convention, Angle first, Angle second, Angle third)
    {
        var (i, j, k, isFixed) = Axes(convention);
        var (a, b, c) = (About(i, first), About(j, second), About(k, third));
        return isFixed ? c * b * a : a * b * c;
    }

    /// <summary>
    /// Angles of a rotation. The middle one is in [−90°, 90°] for three different axes and in [0°, 180°] for a repeated one. At its ends, where
    /// the outer two are not determined, the third is set to zero; the rotation is right all the same.
    /// </summary>
    public static EulerAngles FromMatrix(EulerConvention convention, RotationMatrix r)
    {
        var (i, j, k, isFixed) = Axes(convention);

        // Fixed turns are moving turns in the opposite order.
        if (isFixed)
        {
            (i, k) = (k, i);
        }

        var (a, b, c) = i == k ? Repeated(r, i, j) : Different(r, i, j, k);
        if (isFixed)
        {
            (a, c) = (c, a);
        }

        return new(convention, a, b, c);
    }

    // R = R_i(a) R_j(b) R_i(c), l the axis left out, e = ±1 for i → j → l right- or left-handed.
    private static (double A, double B, double C) Repeated(RotationMatrix r, int i, int j)
    {
        var l = 3 - i - j;
        double e = Handedness(i, j);
        var sine = Math.Sqrt(r[i, j] * r[i, j] + r[i, l] * r[i, l]);
        var b = Deterministic.Atan2(sine, r[i, i]);
        return sine > PoleBelow
            ? (Deterministic.Atan2(r[j, i], -e * r[l, i]), b, Deterministic.Atan2(r[i, j], e * r[i, l]))
            : (Deterministic.Atan2(e * r[l, j], r[j, j]), b, 0);
    }

    // R = R_i(a) R_j(b) R_k(c).
    private static (double A, double B, double C) Different(RotationMatrix r, int i, int j, int k)
    {
        double e = Handedness(i, j);
        var cosine = Math.Sqrt(r[i, i] * r[i, i] + r[i, j] * r[i, j]);
        var b = Deterministic.Atan2(e * r[i, k], cosine);
        return cosine > PoleBelow
            ? (Deterministic.Atan2(-e * r[j, k], r[k, k]), b, Deterministic.Atan2(-e * r[i, j], r[i, i]))
            : (Deterministic.Atan2(e * r[k, j], r[j, j]), b, 0);
    }

    private static int Handedness(int i, int j) => (i + 1) % 3 == j ? 1 : -1;

    private static RotationMatrix About(int axis, Angle angle) => axis switch
    {
        0 => RotationMatrix.AboutX(angle),
        1 => RotationMatrix.AboutY(angle),
        _ => RotationMatrix.AboutZ(angle),
    };

    private static (int I, int J, int K, bool IsFixed) Axes(EulerConvention convention)
    {
        var name = convention.ToString();
        var isFixed = name.StartsWith("Fixed", StringComparison.Ordinal);
        static int Index(char letter) => char.ToLowerInvariant(letter) - 'x';
        return (Index(name[^3]), Index(name[^2]), Index(name[^1]), isFixed);
    }
}
