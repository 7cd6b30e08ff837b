using System.Collections.Immutable;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Control;
using PathPortal.Engine.Paths;
using PathPortal.Engine.Verdicts;

namespace PathPortal.Engine;

/// <summary>
/// Checks a scenario before it is simulated. A scenario without problems can be run; one with problems is answered with them instead of an exception
/// from inside. A start outside the joint limits is no problem here: the run says so by <see cref="Criterion.StartInside"/>.
/// </summary>
public static class ScenarioCheck
{
    /// <summary>Longest run (samples).</summary>
    public const int MostSamples = 10_000_000;

    /// <summary>The first fifty problems, in the order arm, cell, controller, criteria, start, path.</summary>
    public static ImmutableArray<InputProblem> Find(Scenario scenario)
    {
        ArgumentNullException.ThrowIfNull(scenario);
        var check = new InputCheck();
        ArmCheck.Check(scenario.Arm, check);
        check.Pose("cell", "base pose", scenario.Cell.BaseInCell);
        check.Pose("cell", "tool", scenario.Cell.ToolInFlange);
        check.Pose("cell", "work frame", scenario.Cell.WorkInCell);
        ControllerCheck.Check(scenario.Controller, check);
        CriteriaCheck.Check(scenario.Criteria, check);

        var joints = scenario.Arm.Joints.IsDefault ? 0 : scenario.Arm.Joints.Length;
        if (scenario.Start is { } start)
        {
            PathCheck.Joints("start", start.IsDefault ? [] : start.AsSpan(), joints, check);
        }

        if (scenario.FreeTurn is { } turn)
        {
            check.Within("start", "free turn", turn, 2 * Math.PI, "rad");
        }

        Clearances(scenario, check);
        PathCheck.Check(scenario.Path, joints, check);
        if (check.Problems.IsEmpty)
        {
            Length(scenario, check);
        }

        return check.Problems;
    }

    // A clearance that leaves no room between the limits could never be held.
    private static void Clearances(Scenario scenario, InputCheck check)
    {
        for (var i = 0; !scenario.Arm.Joints.IsDefault && i < scenario.Arm.Joints.Length; i++)
        {
            var joint = scenario.Arm.Joints[i];
            var (clearance, unit) = joint.Kind == JointKind.Revolute
                ? (scenario.Criteria.RevoluteClearance, "rad")
                : (scenario.Criteria.PrismaticClearance, "m");
            if (joint.Limits is { Low: { } low, High: { } high } && high.Value > low.Value && 2 * clearance >= high.Value - low.Value)
            {
                var range = InputText.Of(high.Value - low.Value);
                check.Add($"joint {i + 1}", "required clearance", clearance, unit, $"must leave room in the joint's range of {range} {unit}");
            }
        }
    }

    private static void Length(Scenario scenario, InputCheck check)
    {
        var samples = PathCheck.LeastTime(scenario.Path) / scenario.Controller.Period;
        if (!(samples <= MostSamples))
        {
            check.Add("path", "least number of samples", samples, "1", $"must be at most {MostSamples}");
        }
    }
}
