using System.Collections.Immutable;
using PathPortal.Engine.Arms;

namespace PathPortal.Engine.Paths;

/// <summary>
/// A joint-interpolated move: every joint goes its way by one common law of time, so all start and stop together; the slowest joint, measured by its
/// limits, sets the duration. Immutable.
/// </summary>
internal sealed class JointTrajectory
{
    // Where an arm states no joint acceleration the move ramps up in a quarter second (common practice, no source).
    private const double RampWithoutLimit = 0.25; // s

    private readonly ImmutableArray<double> start;
    private readonly ImmutableArray<double> way;
    private readonly ChainLaw? law;

    private JointTrajectory(ImmutableArray<double> start, ImmutableArray<double> way, ChainLaw? law) =>
        (this.start, this.way, this.law) = (start, way, law);

    /// <summary>Time from rest to rest (s); 0 where nothing moves.</summary>
    public double Duration => law?.Duration ?? 0;

    /// <summary>No motion at all.</summary>
    public static JointTrajectory Hold(ImmutableArray<double> at) => new(at, [.. at.Select(_ => 0.0)], null);

    /// <summary>The fastest move within a share of each joint's speed and acceleration limits.</summary>
    /// <param name="from">Joint values at the start (rad or m).</param>
    /// <param name="to">Joint values at the end.</param>
    public static JointTrajectory Plan(ArmModel arm, ImmutableArray<double> from, ImmutableArray<double> to, double share, TimeLaw timeLaw)
    {
        var way = ImmutableArray.CreateBuilder<double>(from.Length);
        var (speed, acceleration) = (double.PositiveInfinity, double.PositiveInfinity);
        for (var i = 0; i < from.Length; i++)
        {
            var distance = to[i] - from[i];
            way.Add(distance);
            var limits = arm.Joints[i].Limits;
            var jointSpeed = share * limits.Speed!.Value.Value;
            var jointAcceleration = limits.Acceleration is { Value: > 0 } given ? share * given.Value : jointSpeed / RampWithoutLimit;
            if (distance != 0)
            {
                speed = Math.Min(speed, jointSpeed / Math.Abs(distance));
                acceleration = Math.Min(acceleration, jointAcceleration / Math.Abs(distance));
            }
        }

        ChainLaw? law = !double.IsFinite(speed) ? null
            : timeLaw == TimeLaw.Trapezoidal ? StagedChainLaw.Plan([new(1, speed, acceleration)])
            : PolynomialChainLaw.Plan(timeLaw, 1, speed, acceleration);
        return new(from, way.MoveToImmutable(), law);
    }

    /// <summary>Writes joint values and speeds at a time since the start (s); held at the ends outside.</summary>
    public void At(double time, Span<double> joints, Span<double> speeds)
    {
        var value = law?.At(time) ?? default;
        for (var i = 0; i < start.Length; i++)
        {
            joints[i] = start[i] + value.Value * way[i];
            speeds[i] = value.First * way[i];
        }
    }
}
