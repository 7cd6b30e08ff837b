using PathPortal.Engine.Verdicts;

namespace PathPortal.Engine.Measures;

/// <summary>Use of a tolerance in process sections: (size + allowance) / tolerance. Deviations by component, and tracking error.</summary>
/// <param name="applies">True at the samples of process sections that the criterion is about.</param>
internal sealed class ToleranceMeasure(
    Criterion criterion, double[] size, bool[] applies, double tolerance, double allowance, string unit) : LimitMeasure(criterion)
{
    public override string NoSampleReason => "The path has no process section.";

    public override double UseAt(int sample) => applies[sample] ? Ratio(Math.Abs(size[sample]) + allowance, tolerance) : double.NaN;

    public override UseDetail Explain(int sample) => new(null, Math.Abs(size[sample]), tolerance - allowance, unit);
}
