namespace PathPortal.Engine.Paths;

/// <summary>
/// s(u) = 10u³ − 15u⁴ + 6u⁵ from 0 to 1, at rest and without acceleration at both ends (Lynch and Park 2017, sec. 9.2.2.2). Over distance D in
/// time T: peak speed 1.875 D/T at half time, peak acceleration (10/√3) D/T² at u = 1/2 ∓ √3/6.
/// </summary>
public static class QuinticLaw
{
    /// <summary>Peak of s′(u).</summary>
    public const double PeakFirst = 1.875;

    /// <summary>Peak of |s″(u)|, 10/√3.</summary>
    public const double PeakSecond = 5.7735026918962576;

    /// <summary>s, ds/du, d²s/du² for u in [0, 1]; held at the ends outside, with zero derivatives.</summary>
    public static LawValue At(double u) => u switch
    {
        < 0 => new(0, 0, 0),
        > 1 => new(1, 0, 0),
        _ => new(
            u * u * u * (10 + u * (-15 + 6 * u)),
            30 * u * u * (1 - u) * (1 - u),
            60 * u * (1 - u) * (1 - 2 * u)),
    };
}
