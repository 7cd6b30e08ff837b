using PathPortal.Engine.Verdicts;

namespace PathPortal.Engine.Measures;

/// <summary>Use of a tolerance in process sections: (size + allowance) / tolerance. Deviations by component, and tracking error.</summary>
internal sealed class ToleranceMeasure(
    Criterion criterion, double[] size, bool[] process, double tolerance, double allowance, string unit) : LimitMeasure(criterion)
{
    public override string NoSampleReason => "The path has no process section.";

    public override double UseAt(int sample) => process[sample] ? Ratio(Math.Abs(size[sample]) + allowance, tolerance) : double.NaN;

    public override UseDetail Explain(int sample) => new(null, Math.Abs(size[sample]), tolerance - allowance, unit);
}
