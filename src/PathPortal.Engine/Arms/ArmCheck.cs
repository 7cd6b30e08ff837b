using System.Collections.Immutable;

namespace PathPortal.Engine.Arms;

/// <summary>Checks an arm model for what no simulation can run on. Problems name joint, value, unit and expectation.</summary>
public static class ArmCheck
{
    // rad or m: no joint goes there, and degrees or millimetres taken for SI often do.
    private const double LargestValue = 1000;

    public static ImmutableArray<InputProblem> Find(ArmModel arm)
    {
        ArgumentNullException.ThrowIfNull(arm);
        var check = new InputCheck();
        Check(arm, check);
        return check.Problems;
    }

    internal static void Check(ArmModel arm, InputCheck check)
    {
        check.Above("arm", "characteristic length", arm.CharacteristicLength, 0, "m");
        check.Pose("arm", "flange", arm.FlangeInLastJoint);
        if (arm.Joints.IsDefaultOrEmpty || arm.Joints.Length > ArmModel.MaxJoints)
        {
            check.Add("arm", "number of joints", arm.Joints.IsDefault ? 0 : arm.Joints.Length, "1", $"must be 1 to {ArmModel.MaxJoints}");
            return;
        }

        for (var i = 0; i < arm.Joints.Length; i++)
        {
            Check($"joint {i + 1}", arm.Joints[i], check);
        }

        if (arm.Joints.All(j => j.Kind == JointKind.Prismatic) && arm.Joints.Length > 3)
        {
            check.Add("arm", "prismatic joints", arm.Joints.Length, "1", "more than three sliding joints alone are redundant at every posture");
        }
    }

    private static void Check(string place, Joint joint, InputCheck check)
    {
        var unit = joint.Kind == JointKind.Revolute ? "rad" : "m";
        check.Known(place, "kind", joint.Kind);
        check.Pose(place, "pose in the joint before", joint.PoseInPrevious);
        check.Within(place, "zero", joint.Zero, LargestValue, unit);
        if (joint.Sign is not (1 or -1))
        {
            check.Add(place, "sign", joint.Sign, "1", "must be 1 or -1");
        }

        var limits = joint.Limits;
        if (limits.Continuous && joint.Kind == JointKind.Prismatic)
        {
            check.Add(place, "continuous", null, "", "only a revolute joint can turn without end");
        }

        if (limits.Continuous && (limits.Low ?? limits.High) is { } bound)
        {
            check.Add(place, "position limit", bound.Value, unit, "a continuous joint has no position limit");
        }

        if (limits.Low is { } low)
        {
            check.Within(place, "low position limit", low.Value, LargestValue, unit);
        }

        if (limits.High is { } high)
        {
            check.Within(place, "high position limit", high.Value, LargestValue, unit);
            if (limits.Low is { } lower && high.Value <= lower.Value)
            {
                check.Add(place, "high position limit", high.Value, unit, $"must be above the low limit, {InputText.Of(lower.Value)} {unit}");
            }
        }

        Positive(place, "speed limit", limits.Speed, unit + "/s", check);
        Positive(place, "acceleration limit", limits.Acceleration, unit + "/s²", check);
        Positive(place, "jerk limit", limits.Jerk, unit + "/s³", check);
    }

    private static void Positive(string place, string quantity, Limit? limit, string unit, InputCheck check)
    {
        if (limit is { } given)
        {
            check.Above(place, quantity, given.Value, 0, unit);
        }
    }
}
