using PathPortal.Engine.Arms;
using PathPortal.Engine.Verdicts;
using PathPortal.Web.Shared;

namespace PathPortal.Web.Features.Runs;

/// <summary>Which charts a run gets, and the limits drawn in them.</summary>
public static class Lanes
{
    private const double DegreesPerRadian = 180 / Math.PI;

    public static IReadOnlyList<Lane> Of(ArmModel arm, CriteriaSheet criteria)
    {
        List<Lane> lanes = [Error(criteria)];
        if (criteria.AxisTolerance is { } axis)
            lanes.Add(new("axis", "Tool axis angle", "°", [new("axis", "tool axis", 0)],
                [new((axis - criteria.AxisAllowance) * DegreesPerRadian, "tolerance")]));
        lanes.Add(new("joint-speed", "Joint speed asked for", "% of allowed", PerJoint(arm, "s", _ => true), [new(100, "limit")]));
        if (arm.Joints.Any(j => j.Limits.Acceleration is not null))
            lanes.Add(new("joint-acceleration", "Joint acceleration asked for", "% of allowed", PerJoint(arm, "b", _ => true), [new(100, "limit")]));
        AddMargin(lanes, arm, JointKind.Revolute, "Margin to position limits", "°", criteria.RevoluteClearance * DegreesPerRadian);
        AddMargin(lanes, arm, JointKind.Prismatic, "Margin of sliding joints", "mm", criteria.PrismaticClearance * 1e3);
        lanes.Add(new("sigma", "Smallest singular value", "σ min", [new("sigma", "σ min", 0)], [new(criteria.RequiredSigmaMin, "required")]));
        lanes.Add(new("condition", "Condition number", "κ", [new("condition", "κ", 0)], [], FromZero: false, Logarithmic: true));
        lanes.Add(new("tool-speed", "Tool speed", "mm/s", [new("reference.speed", "reference", 1), new("speed", "tool", 0)], []));
        return lanes;
    }

    private static Lane Error(CriteriaSheet criteria)
    {
        List<LaneLimit> limits = [];
        Add(criteria.AcrossTolerance, criteria.AcrossAllowance, "across");
        Add(criteria.StandOffTolerance, criteria.StandOffAllowance, "stand-off");
        Add(criteria.TrackingTolerance, criteria.TrackingAllowance, "tracking");
        return new("error", "Tracking error and path deviation", "mm",
            [new("track", "tracking, at equal times", 0), new("across", "across the path", 1), new("standoff", "stand-off", 2)], limits);

        // The line stands where use reaches 100 %: the tolerance less what is allowed for beforehand.
        void Add(double? tolerance, double allowance, string name)
        {
            if (tolerance is not { } given)
                return;
            var value = (given - allowance) * 1e3;
            var same = limits.FindIndex(l => Math.Abs(l.Value - value) < 1e-9);
            if (same >= 0)
                limits[same] = limits[same] with { Label = limits[same].Label.Replace(" allowed", $" and {name} allowed", StringComparison.Ordinal) };
            else
                limits.Add(new(value, $"{name} allowed {Format.Number(value, 2)}"));
        }
    }

    private static void AddMargin(List<Lane> lanes, ArmModel arm, JointKind kind, string title, string unit, double clearance)
    {
        var lines = PerJoint(arm, "m", j => j.Kind == kind && (j.Limits.Low ?? j.Limits.High) is not null);
        if (lines.Count > 0)
            lanes.Add(new(kind == JointKind.Revolute ? "margin" : "margin-sliding", title, unit, lines,
                [new(clearance, $"required {Format.Number(clearance, 1)}")]));
    }

    private static List<LaneLine> PerJoint(ArmModel arm, string column, Func<Joint, bool> which) =>
        [.. arm.Joints.Select((joint, j) => (joint, j)).Where(x => which(x.joint)).Select(x => new LaneLine($"{column}{x.j}", x.joint.Name, x.j))];
}
