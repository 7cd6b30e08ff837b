namespace PathPortal.Engine.Paths;

/// <summary>
/// The cubic or quintic law over a whole chain. It has one peak speed, so the slowest speed allowed anywhere on the chain bounds it: no programmed
/// speed is ever exceeded, faster stretches are not used.
/// </summary>
internal sealed class PolynomialChainLaw : ChainLaw
{
    private readonly bool quintic;
    private readonly double length;

    private PolynomialChainLaw(bool quintic, double length, double duration) =>
        (this.quintic, this.length, Duration) = (quintic, length, duration);

    public override double Duration { get; }

    /// <summary>The fastest law within a peak speed and a peak acceleration.</summary>
    public static PolynomialChainLaw Plan(TimeLaw law, double length, double speed, double acceleration)
    {
        var quintic = law == TimeLaw.Quintic;
        var (first, second) = quintic
            ? (QuinticLaw.PeakFirst, QuinticLaw.PeakSecond)
            : (CubicLaw.PeakFirst, CubicLaw.PeakSecond);
        return new(quintic, length, Math.Max(first * length / speed, Math.Sqrt(second * length / acceleration)));
    }

    public override LawValue At(double time)
    {
        var u = time / Duration;
        var value = quintic ? QuinticLaw.At(u) : CubicLaw.At(u);
        return new(length * value.Value, length / Duration * value.First, length / (Duration * Duration) * value.Second);
    }
}
