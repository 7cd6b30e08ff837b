using System.Collections.Immutable;
using PathPortal.Engine.Verdicts;

namespace PathPortal.Engine.Measures;

/// <summary>The measures a criteria sheet asks for, over the samples of one run.</summary>
internal static class LimitMeasures
{
    /// <summary>One measure per criterion that has a use and is asked for, in the order of <see cref="Criterion"/>.</summary>
    public static ImmutableArray<LimitMeasure> For(Scenario scenario, RunSamples samples)
    {
        var (arm, path, criteria) = (scenario.Arm, scenario.Path, scenario.Criteria);
        var measures = new List<LimitMeasure>();
        void Tolerance(Criterion criterion, double[] size, double? tolerance, double allowance, string unit)
        {
            if (tolerance is { } given)
            {
                measures.Add(new ToleranceMeasure(criterion, size, samples.Process, given, allowance, unit));
            }
        }

        Tolerance(Criterion.AcrossPath, samples.AcrossPath, criteria.AcrossTolerance, criteria.AcrossAllowance, "m");
        Tolerance(Criterion.StandOff, samples.StandOff, criteria.StandOffTolerance, criteria.StandOffAllowance, "m");
        Tolerance(Criterion.ToolAxis, samples.ToolAxisAngle, criteria.AxisTolerance, criteria.AxisAllowance, "rad");
        Tolerance(Criterion.Tracking, samples.TrackingError, criteria.TrackingTolerance, criteria.TrackingAllowance, "m");
        measures.Add(new JointPositionMeasure(arm, samples.Joints, criteria));
        measures.Add(JointRateMeasure.Speed(arm, samples, criteria));
        measures.Add(JointRateMeasure.Acceleration(arm, samples, criteria));
        measures.Add(new SingularityMeasure(path, samples, criteria.RequiredSigmaMin));
        if (criteria.ToolSpeedTolerance is { } share)
        {
            measures.Add(new ToolSpeedMeasure(path, samples, share));
        }

        return [.. measures];
    }
}
