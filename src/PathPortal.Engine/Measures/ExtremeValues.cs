using PathPortal.Engine.Arms;
using PathPortal.Engine.Paths;
using PathPortal.Engine.Verdicts;

namespace PathPortal.Engine.Measures;

/// <summary>Finds the extremes of a run's samples and their places; the earliest of equal ones. Values that are not finite count as largest.</summary>
internal static class ExtremeValues
{
    public static RunExtremes Of(Scenario scenario, RunSamples samples)
    {
        bool Everywhere(int k) => true;
        bool Process(int k) => samples.Process[k];
        bool ToolSpace(int k) => scenario.Path.Waypoints[samples.Waypoint[k]].Motion != MotionKind.Joint;

        var tracking = Largest(samples.Count, k => samples.TrackingError[k], Everywhere);
        var turn = Largest(samples.Count, k => samples.TurnError[k], Everywhere);
        var deviation = Largest(samples.Count, k => Length(samples.AcrossPath[k], samples.StandOff[k]), Process);
        var sigma = Largest(samples.Count, k => -samples.SigmaMin[k], ToolSpace);
        var condition = Largest(samples.Count, k => samples.SigmaMax[k] / samples.SigmaMin[k], ToolSpace);
        var speed = Largest(samples.Count, k => samples.ToolSpeed[k], Everywhere);

        return new()
        {
            MaxTrackingError = Value(samples.TrackingError, tracking),
            MaxTrackingErrorPlace = PlaceOf(samples, tracking),
            RmsTrackingError = RootMeanSquare(samples.TrackingError),
            MaxTurnError = Value(samples.TurnError, turn),
            MaxTurnErrorPlace = PlaceOf(samples, turn),
            MaxDeviation = deviation is { } d ? Length(samples.AcrossPath[d], samples.StandOff[d]) : null,
            MaxDeviationPlace = PlaceOf(samples, deviation),
            MinSigma = sigma is { } s ? samples.SigmaMin[s] : null,
            MinSigmaPlace = PlaceOf(samples, sigma),
            MaxCondition = condition is { } c ? samples.SigmaMax[c] / samples.SigmaMin[c] : null,
            MaxToolSpeed = Value(samples.ToolSpeed, speed),
            MaxJointSpeedDemand = LargestDemand(scenario.Arm, samples.JointSpeedDemands),
        };
    }

    /// <summary>The place of a sample.</summary>
    public static Place PlaceOf(RunSamples samples, int sample) =>
        new(sample, sample * samples.Period, samples.PathFraction[sample], samples.Waypoint[sample]);

    private static Place? PlaceOf(RunSamples samples, int? sample) => sample is { } k ? PlaceOf(samples, k) : null;

    private static double Value(double[] column, int? sample) => sample is { } k ? column[k] : 0;

    private static double Length(double across, double along) => Math.Sqrt(across * across + along * along);

    private static int? Largest(int count, Func<int, double> value, Func<int, bool> applies)
    {
        int? place = null;
        var largest = double.NegativeInfinity;
        for (var k = 0; k < count; k++)
        {
            if (!applies(k))
            {
                continue;
            }

            var candidate = value(k);
            candidate = double.IsNaN(candidate) ? double.PositiveInfinity : candidate;
            if (place is null || candidate > largest)
            {
                (place, largest) = (k, candidate);
            }
        }

        return place;
    }

    private static double RootMeanSquare(double[] values)
    {
        var sum = 0.0;
        foreach (var value in values)
        {
            sum += value * value;
        }

        return values.Length == 0 ? 0 : Math.Sqrt(sum / values.Length);
    }

    private static double LargestDemand(ArmModel arm, double[][] demands)
    {
        var largest = 0.0;
        for (var i = 0; i < demands.Length; i++)
        {
            foreach (var demand in arm.Joints[i].Kind == JointKind.Revolute ? demands[i] : [])
            {
                largest = Math.Abs(demand) <= largest ? largest : Math.Abs(demand);
            }
        }

        return largest;
    }
}
