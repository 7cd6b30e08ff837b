using PathPortal.Engine.Arms;
using PathPortal.Engine.Verdicts;

namespace PathPortal.Engine.Measures;

/// <summary>
/// Use of joint position: required clearance / smaller distance to a limit, +∞ at and beyond a limit; turns used / turns allowed for a joint that
/// turns without end. The worst joint counts.
/// </summary>
internal sealed class JointPositionMeasure(ArmModel arm, double[][] joints, CriteriaSheet criteria) : LimitMeasure(Criterion.JointPosition)
{
    public override string NoSampleReason => "No joint has position limits.";

    public override string? MissingLimit { get; } =
        arm.Joints.Index().FirstOrDefault(j => !j.Item.Limits.Continuous && (j.Item.Limits.Low is null || j.Item.Limits.High is null))
            is { Item: not null } missing
            ? $"The position limits of joint {missing.Index + 1} are not given."
            : null;

    public override double UseAt(int sample)
    {
        var worst = double.NaN;
        for (var i = 0; i < joints.Length; i++)
        {
            worst = UseRules.Worse(worst, UseOf(i, joints[i][sample]));
        }

        return worst;
    }

    public override UseDetail Explain(int sample)
    {
        var (worst, joint) = (double.NaN, 0);
        for (var i = 0; i < joints.Length; i++)
        {
            var use = UseOf(i, joints[i][sample]);
            if (UseRules.IsWorse(use, worst))
            {
                (worst, joint) = (use, i);
            }
        }

        var q = joints[joint][sample];
        return arm.Joints[joint].Limits.Continuous
            ? new(joint, Math.Abs(q), criteria.ContinuousTurns * 2 * Math.PI, "rad")
            : new(joint, Distance(joint, q), Clearance(joint), arm.Joints[joint].Kind == JointKind.Revolute ? "rad" : "m");
    }

    private double UseOf(int joint, double q)
    {
        var limits = arm.Joints[joint].Limits;
        return limits.Continuous ? Ratio(Math.Abs(q), criteria.ContinuousTurns * 2 * Math.PI)
            : limits.Low is null && limits.High is null ? double.NaN
            : Distance(joint, q) is var distance && distance > 0 ? Ratio(Clearance(joint), distance)
            : double.PositiveInfinity;
    }

    private double Distance(int joint, double q)
    {
        var limits = arm.Joints[joint].Limits;
        var above = limits.Low is { } low ? q - low.Value : double.PositiveInfinity;
        var below = limits.High is { } high ? high.Value - q : double.PositiveInfinity;
        return double.IsFinite(q) ? Math.Min(above, below) : double.NaN;
    }

    private double Clearance(int joint) =>
        arm.Joints[joint].Kind == JointKind.Revolute ? criteria.RevoluteClearance : criteria.PrismaticClearance;
}
