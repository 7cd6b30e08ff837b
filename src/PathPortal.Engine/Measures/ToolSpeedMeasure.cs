using PathPortal.Engine.Paths;
using PathPortal.Engine.Verdicts;

namespace PathPortal.Engine.Measures;

/// <summary>
/// Fidelity of tool speed in process sections after their lead-in: |tool speed − reference speed at that moment| / (share × programmed speed). While
/// the reference stands still (dwell) there is no speed to keep.
/// </summary>
internal sealed class ToolSpeedMeasure(ToolPath path, RunSamples samples, double share) : LimitMeasure(Criterion.ToolSpeed)
{
    public override string NoSampleReason => "The path has no process section in motion.";

    public override double UseAt(int sample) => samples.Process[sample] && samples.ReferenceSpeed[sample] != 0
        ? Ratio(Difference(sample), Allowed(sample))
        : double.NaN;

    public override UseDetail Explain(int sample) => new(null, Difference(sample), Allowed(sample), "m/s");

    private double Difference(int sample) => Math.Abs(samples.ToolSpeed[sample] - samples.ReferenceSpeed[sample]);

    private double Allowed(int sample) => share * path.Waypoints[samples.Waypoint[sample]].Speed;
}
