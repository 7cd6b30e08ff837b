using System.Collections.Immutable;
using System.Globalization;
using PathPortal.Engine.Arms;

namespace PathPortal.Engine.Postures;

/// <summary>How far a posture is from the joint position limits.</summary>
internal static class JointRoom
{
    /// <summary>The smallest distance to a limit over all joints, as a share of the joint's range; negative beyond a limit, +∞ without limits.</summary>
    public static double Smallest(ArmModel arm, ImmutableArray<double> joints)
    {
        var smallest = double.PositiveInfinity;
        for (var i = 0; i < joints.Length; i++)
        {
            if (arm.Joints[i].Limits is { Low: { } low, High: { } high })
            {
                var room = Math.Min(joints[i] - low.Value, high.Value - joints[i]) / (high.Value - low.Value);
                smallest = Math.Min(smallest, room);
            }
        }

        return smallest;
    }

    /// <summary>The joints beyond a limit, in words with degrees or millimetres.</summary>
    public static string Describe(ArmModel arm, ImmutableArray<double> joints)
    {
        var parts = new List<string>();
        for (var i = 0; i < joints.Length; i++)
        {
            var joint = arm.Joints[i];
            var passed = joint.Limits.Low is { } low && joints[i] < low.Value ? low
                : joint.Limits.High is { } high && joints[i] > high.Value ? high
                : (Limit?)null;
            if (passed is { } limit)
            {
                parts.Add($"joint {i + 1} at {Show(joint.Kind, joints[i])}, limit {Show(joint.Kind, limit.Value)}");
            }
        }

        return string.Join("; ", parts);
    }

    private static string Show(JointKind kind, double value) => kind == JointKind.Revolute
        ? (value * (180 / Math.PI)).ToString("0.0", CultureInfo.InvariantCulture) + "°"
        : (value * 1000).ToString("0.0", CultureInfo.InvariantCulture) + " mm";
}
