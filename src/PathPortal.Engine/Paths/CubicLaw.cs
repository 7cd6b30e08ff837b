namespace PathPortal.Engine.Paths;

/// <summary>
/// s(u) = 3u² − 2u³ from 0 to 1, at rest at both ends, with acceleration that jumps there (Lynch and Park 2017, sec. 9.2.2.1). Over distance D
/// in time T: peak speed 1.5 D/T at half time, peak acceleration 6 D/T² at the ends.
/// </summary>
public static class CubicLaw
{
    /// <summary>Peak of s′(u).</summary>
    public const double PeakFirst = 1.5;

    /// <summary>Peak of |s″(u)|.</summary>
    public const double PeakSecond = 6;

    /// <summary>s, ds/du, d²s/du² for u in [0, 1]; held at the ends outside, with zero derivatives.</summary>
    public static LawValue At(double u) => u switch
    {
        < 0 => new(0, 0, 0),
        > 1 => new(1, 0, 0),
        _ => new(u * u * (3 - 2 * u), 6 * u * (1 - u), 6 - 12 * u),
    };
}
