using System.Collections.Immutable;
using PathPortal.Engine.Paths;
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
            if (tolerance is { } given && IsAsked(criteria, path, criterion))
            {
                var applies = criterion == Criterion.ToolAxis ? AxisConstrained(path, samples) : samples.Process;
                measures.Add(new ToleranceMeasure(criterion, size, applies, given, allowance, unit));
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

    /// <summary>
    /// False for a criterion whose tolerance the sheet does not give, and for the tool axis where every process section leaves the orientation free.
    /// </summary>
    public static bool IsAsked(CriteriaSheet criteria, ToolPath path, Criterion criterion) => criterion switch
    {
        Criterion.AcrossPath => criteria.AcrossTolerance is not null,
        Criterion.StandOff => criteria.StandOffTolerance is not null,
        Criterion.ToolAxis => criteria.AxisTolerance is not null && !LeavesOrientationFree(path),
        Criterion.Tracking => criteria.TrackingTolerance is not null,
        Criterion.ToolSpeed => criteria.ToolSpeedTolerance is not null,
        _ => true,
    };

    private static bool LeavesOrientationFree(ToolPath path)
    {
        var process = path.Waypoints.Where(w => w.ProcessOn);
        return process.Any() && process.All(w => w.Task == TaskKind.Point);
    }

    // A ball-shaped tool has no axis to hold.
    private static bool[] AxisConstrained(ToolPath path, RunSamples samples) =>
        [.. samples.Process.Select((process, k) => process && path.Waypoints[samples.Waypoint[k]].Task != TaskKind.Point)];
}
