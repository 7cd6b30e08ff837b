using PathPortal.Engine.Paths;
using PathPortal.Engine.Verdicts;

namespace PathPortal.Engine.Measures;

/// <summary>
/// Nearness to a singularity: required σ_min / actual σ_min of the scaled Jacobian, on tool-space moves only. A joint move passes singular postures
/// unharmed.
/// </summary>
internal sealed class SingularityMeasure(ToolPath path, RunSamples samples, double required) : LimitMeasure(Criterion.Singularity)
{
    public override string NoSampleReason => "The path has joint moves only.";

    public override double UseAt(int sample) => path.Waypoints[samples.Waypoint[sample]].Motion == MotionKind.Joint
        ? double.NaN
        : Ratio(required, samples.SigmaMin[sample]);

    public override UseDetail Explain(int sample) => new(null, samples.SigmaMin[sample], required, "1");
}
