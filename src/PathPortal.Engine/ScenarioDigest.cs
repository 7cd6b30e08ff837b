using System.Security.Cryptography;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Control;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;
using PathPortal.Engine.Verdicts;

namespace PathPortal.Engine;

/// <summary>
/// Names a scenario by its numbers: SHA-256 over the raw bits of everything a run depends on and <see cref="NumericsVersion"/>. Same digest, same
/// results.
/// </summary>
/// <remarks>
/// Byte order, all little-endian: a tag and the numerics version; the arm (characteristic length, flange, joints); the cell's poses; the controller;
/// the criteria; start and free turn; the waypoints. Numbers are IEEE bits, so 0 and −0 differ; counts, enumerations and flags are 32-bit integers;
/// an optional value is a flag and, when present, the value; a list is its count and its items. Left out, because results hold none of them: names of
/// arm and joints, sources of limits, labels and source lines of waypoints, units the path's source was written in. Near thresholds count as they act,
/// defaults filled in.
/// </remarks>
public static class ScenarioDigest
{
    private const int LayoutTag = 0x31535050; // "PPS1": raise the digit when the layout changes

    /// <summary>The 32 bytes.</summary>
    public static byte[] Compute(Scenario scenario)
    {
        ArgumentNullException.ThrowIfNull(scenario);
        using var hash = IncrementalHash.CreateHash(HashAlgorithmName.SHA256);
        var writer = new DigestWriter(hash);
        writer.Add(LayoutTag);
        writer.Add(NumericsVersion.Current);
        Add(writer, scenario.Arm);
        writer.Add(scenario.Cell.BaseInCell);
        writer.Add(scenario.Cell.ToolInFlange);
        writer.Add(scenario.Cell.WorkInCell);
        Add(writer, scenario.Controller);
        Add(writer, scenario.Criteria);
        writer.Add(scenario.Start);
        writer.Add(scenario.FreeTurn);
        Add(writer, scenario.Path);
        writer.Flush();
        return hash.GetHashAndReset();
    }

    private static void Add(DigestWriter writer, ArmModel arm)
    {
        writer.Add(arm.CharacteristicLength);
        writer.Add(arm.FlangeInLastJoint);
        writer.Add(arm.Joints.Length);
        foreach (var joint in arm.Joints)
        {
            writer.Add((int)joint.Kind);
            writer.Add(joint.PoseInPrevious);
            writer.Add(joint.Sign);
            writer.Add(joint.Zero);
            writer.Add(joint.Limits.Continuous);
            writer.Add(joint.Limits.Low?.Value);
            writer.Add(joint.Limits.High?.Value);
            writer.Add(joint.Limits.Speed?.Value);
            writer.Add(joint.Limits.Acceleration?.Value);
            writer.Add(joint.Limits.Jerk?.Value);
        }
    }

    private static void Add(DigestWriter writer, ControllerSettings controller)
    {
        writer.Add(controller.Period);
        writer.Add(controller.PositionGain);
        writer.Add(controller.OrientationGain);
        writer.Add((int)controller.Feedforward);
        writer.Add((int)controller.Damping.Kind);
        writer.Add(controller.Damping.Lambda);
        writer.Add(controller.Damping.Epsilon);
        writer.Add(controller.MidRangeGain);
        writer.Add(controller.ServoTimeConstant);
        writer.Add((int)controller.Feedback);
        writer.Add(controller.MeasurementDelay);
        writer.Add(controller.CommandDelay);
        writer.Add(controller.LimitsSpeed);
        writer.Add(controller.LimitsAcceleration);
        writer.Add((int)controller.SpeedLimiter);
        writer.Add((int)controller.LimitReaction);
        writer.Add((int)controller.TimeLaw);
        writer.Add(controller.ToolAcceleration);
        writer.Add(controller.ToolTurnSpeed);
        writer.Add(controller.ToolTurnAcceleration);
    }

    private static void Add(DigestWriter writer, CriteriaSheet criteria)
    {
        writer.Add(criteria.AcrossTolerance);
        writer.Add(criteria.AcrossAllowance);
        writer.Add(criteria.StandOffTolerance);
        writer.Add(criteria.StandOffAllowance);
        writer.Add(criteria.AxisTolerance);
        writer.Add(criteria.AxisAllowance);
        writer.Add(criteria.TrackingTolerance);
        writer.Add(criteria.TrackingAllowance);
        writer.Add(criteria.RevoluteClearance);
        writer.Add(criteria.PrismaticClearance);
        writer.Add(criteria.ContinuousTurns);
        writer.Add(criteria.SpeedShare);
        writer.Add(criteria.AccelerationShare);
        writer.Add(criteria.RequiredSigmaMin);
        writer.Add(criteria.SingularityBinds);
        writer.Add(criteria.ToolSpeedTolerance);
        foreach (var criterion in Enum.GetValues<Criterion>().Order())
        {
            writer.Add(criteria.Near.GetValueOrDefault(criterion, CriteriaSheet.DefaultNear));
        }
    }

    private static void Add(DigestWriter writer, ToolPath path)
    {
        writer.Add(path.Waypoints.Length);
        foreach (var waypoint in path.Waypoints)
        {
            writer.Add(waypoint.Position);
            writer.Add(waypoint.Orientation.W);
            writer.Add(waypoint.Orientation.X);
            writer.Add(waypoint.Orientation.Y);
            writer.Add(waypoint.Orientation.Z);
            writer.Add((int)waypoint.Motion);
            writer.Add((int)waypoint.Task);
            writer.Add(waypoint.Speed);
            writer.Add(waypoint.JointSpeedShare);
            writer.Add(waypoint.Joints);
            writer.Add(waypoint.CornerReach);
            writer.Add(waypoint.ProcessOn);
            writer.Add(waypoint.LeadIn);
            writer.Add(waypoint.Dwell);
        }
    }
}
