using PathPortal.Engine.Verdicts;

namespace PathPortal.Engine.Measures;

/// <summary>One criterion's use of its limit, sample by sample: 1 exactly at the limit, NaN where it does not apply, +∞ where it fails without a number.</summary>
internal abstract class LimitMeasure(Criterion criterion)
{
    public Criterion Criterion { get; } = criterion;

    /// <summary>Why the criterion can't be passed whatever the samples show, such as a limit that was not given; null where it can.</summary>
    public virtual string? MissingLimit => null;

    /// <summary>Why there may be no sample to judge by, for a criterion that met none.</summary>
    public abstract string NoSampleReason { get; }

    public abstract double UseAt(int sample);

    /// <summary>Joint, value and limit behind <see cref="UseAt"/>, at a sample where the criterion applies.</summary>
    public abstract UseDetail Explain(int sample);

    public double[] Column(int count)
    {
        var use = new double[count];
        for (var k = 0; k < count; k++)
        {
            use[k] = UseAt(k);
        }

        return use;
    }

    /// <summary>value / limit for values and limits that are not negative; +∞ for a zero or missing denominator and whatever is not finite.</summary>
    protected static double Ratio(double value, double limit)
    {
        var use = value / limit;
        return limit > 0 && double.IsFinite(use) ? use : double.PositiveInfinity;
    }
}
