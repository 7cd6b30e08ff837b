using PathPortal.Engine;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Verdicts;

namespace PathPortal.Web.Features.Runs.Samples;

/// <summary>
/// Every column the run page shows, in millimetres, degrees, seconds and percent. Names ending in a number are per joint, from 0: q value,
/// v speed, d speed demand, a acceleration demand, m margin to the nearest position limit, s share of the allowed speed, b share of the
/// allowed acceleration. "use.JointSpeed" and its like are limit uses.
/// </summary>
public sealed class SampleColumns
{
    private const double DegreesPerRadian = 180 / Math.PI;
    private const double MillimetresPerMetre = 1e3;

    private readonly Dictionary<string, SampleColumn> _byName;

    private SampleColumns(RunSamples samples, IEnumerable<SampleColumn> columns)
    {
        Samples = samples;
        All = [.. columns];
        _byName = All.ToDictionary(c => c.Name, StringComparer.Ordinal);
    }

    public RunSamples Samples { get; }

    public IReadOnlyList<SampleColumn> All { get; }

    public static string UseName(Criterion criterion) => $"use.{criterion}";

    public static SampleColumns Of(RunSamples samples, ArmModel arm, CriteriaSheet criteria) =>
        new(samples, [.. Tool(samples), .. Solver(samples), .. Joints(samples, arm, criteria), .. Uses(samples)]);

    public SampleColumn? Find(string name) => _byName.GetValueOrDefault(name);

    private static IEnumerable<SampleColumn> Tool(RunSamples s)
    {
        yield return new("reference.time", k => s.ReferenceTime[k]);
        yield return new("path", k => s.PathFraction[k] * 100);
        yield return new("waypoint", k => s.Waypoint[k]);
        yield return new("process", k => s.Process[k] ? 1 : 0);
        yield return new("track", k => s.TrackingError[k] * MillimetresPerMetre);
        yield return new("turn", k => s.TurnError[k] * DegreesPerRadian);
        yield return new("across", k => s.AcrossPath[k] * MillimetresPerMetre);
        yield return new("standoff", k => s.StandOff[k] * MillimetresPerMetre);
        yield return new("axis", k => s.ToolAxisAngle[k] * DegreesPerRadian);
        yield return new("speed", k => s.ToolSpeed[k] * MillimetresPerMetre);
        yield return new("reference.speed", k => s.ReferenceSpeed[k] * MillimetresPerMetre);
        for (var axis = 0; axis < 3; axis++)
        {
            var (tool, reference) = (s.ToolPosition[axis], s.ReferencePosition[axis]);
            yield return new($"tool.{"xyz"[axis]}", k => tool[k] * MillimetresPerMetre);
            yield return new($"reference.{"xyz"[axis]}", k => reference[k] * MillimetresPerMetre);
        }
        for (var part = 0; part < 4; part++)
        {
            var orientation = s.ToolOrientation[part];
            yield return new($"turned.{"wxyz"[part]}", k => orientation[k]);
        }
    }

    private static IEnumerable<SampleColumn> Solver(RunSamples s)
    {
        yield return new("sigma", k => s.SigmaMin[k]);
        yield return new("condition", k => s.SigmaMax[k] / s.SigmaMin[k]);
        yield return new("damping", k => Math.Sqrt(s.DampingSquared[k]));
        yield return new("speed.scale", k => s.SpeedScale[k] * 100);
        yield return new("path.scale", k => s.PathScale[k] * 100);
    }

    private static IEnumerable<SampleColumn> Joints(RunSamples s, ArmModel arm, CriteriaSheet criteria)
    {
        for (var j = 0; j < s.JointCount; j++)
        {
            var limits = arm.Joints[j].Limits;
            var unit = arm.Joints[j].Kind == JointKind.Revolute ? DegreesPerRadian : MillimetresPerMetre;
            var (q, v, d, a) = (s.Joints[j], s.JointSpeeds[j], s.JointSpeedDemands[j], s.JointAccelerationDemands[j]);
            yield return new($"q{j}", k => q[k] * unit);
            yield return new($"v{j}", k => v[k] * unit);
            yield return new($"d{j}", k => d[k] * unit);
            yield return new($"a{j}", k => a[k] * unit);
            yield return new($"m{j}", Margin(q, limits, unit));
            yield return new($"s{j}", Share(d, limits.Speed, criteria.SpeedShare));
            yield return new($"b{j}", Share(a, limits.Acceleration, criteria.AccelerationShare));
        }
    }

    private static IEnumerable<SampleColumn> Uses(RunSamples s) =>
        s.Use.OrderBy(u => u.Key).Select(u => new SampleColumn(UseName(u.Key), k => u.Value[k] * 100));

    private static Func<int, double> Margin(double[] q, JointLimits limits, double unit)
    {
        var low = limits.Low?.Value ?? double.NegativeInfinity;
        var high = limits.High?.Value ?? double.PositiveInfinity;
        return double.IsInfinity(low) && double.IsInfinity(high)
            ? _ => double.NaN
            : k => Math.Min(q[k] - low, high - q[k]) * unit;
    }

    private static Func<int, double> Share(double[] demand, Limit? limit, double share) =>
        limit is { } given ? k => Math.Abs(demand[k]) / (given.Value * share) * 100 : _ => double.NaN;
}
