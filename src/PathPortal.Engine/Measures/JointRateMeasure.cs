using PathPortal.Engine.Arms;
using PathPortal.Engine.Verdicts;

namespace PathPortal.Engine.Measures;

/// <summary>
/// Use of joint speed or acceleration: what the loop asked for before any limiting / (limit × allowed share), so that a limiter hides nothing. The worst
/// joint counts.
/// </summary>
internal sealed class JointRateMeasure : LimitMeasure
{
    private readonly ArmModel arm;
    private readonly double[][] demands;
    private readonly double[] allowed;

    private JointRateMeasure(Criterion criterion, ArmModel arm, double[][] demands, Func<JointLimits, Limit?> limit, double share)
        : base(criterion)
    {
        this.arm = arm;
        this.demands = demands;
        allowed = [.. arm.Joints.Select(j => limit(j.Limits) is { } given ? given.Value * share : double.NaN)];
        var missing = Array.FindIndex(allowed, double.IsNaN);
        MissingLimit = missing < 0 ? null : $"The {Word} limit of joint {missing + 1} is not given.";
    }

    public override string? MissingLimit { get; }

    public override string NoSampleReason => $"No joint has a {Word} limit.";

    private string Word => Criterion == Criterion.JointSpeed ? "speed" : "acceleration";

    public static JointRateMeasure Speed(ArmModel arm, RunSamples samples, CriteriaSheet criteria) =>
        new(Criterion.JointSpeed, arm, samples.JointSpeedDemands, l => l.Speed, criteria.SpeedShare);

    public static JointRateMeasure Acceleration(ArmModel arm, RunSamples samples, CriteriaSheet criteria) =>
        new(Criterion.JointAcceleration, arm, samples.JointAccelerationDemands, l => l.Acceleration, criteria.AccelerationShare);

    public override double UseAt(int sample)
    {
        var worst = double.NaN;
        for (var i = 0; i < demands.Length; i++)
        {
            worst = UseRules.Worse(worst, UseOf(i, sample));
        }

        return worst;
    }

    public override UseDetail Explain(int sample)
    {
        var (worst, joint) = (double.NaN, 0);
        for (var i = 0; i < demands.Length; i++)
        {
            var use = UseOf(i, sample);
            if (UseRules.IsWorse(use, worst))
            {
                (worst, joint) = (use, i);
            }
        }

        var length = arm.Joints[joint].Kind == JointKind.Revolute ? "rad" : "m";
        return new(
            joint, Math.Abs(demands[joint][sample]), allowed[joint], Criterion == Criterion.JointSpeed ? length + "/s" : length + "/s²");
    }

    private double UseOf(int joint, int sample) =>
        double.IsNaN(allowed[joint]) ? double.NaN : Ratio(Math.Abs(demands[joint][sample]), allowed[joint]);
}
