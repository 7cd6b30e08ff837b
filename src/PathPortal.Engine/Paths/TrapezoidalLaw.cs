namespace PathPortal.Engine.Paths;

/// <summary>
/// Constant acceleration, cruise, constant deceleration over a distance, from rest to rest. Where the distance is too short to reach the cruise
/// speed, D &lt; V²/A, the profile is a triangle with peak √(D A) (Lynch and Park 2017, sec. 9.2.2.3). Immutable.
/// </summary>
public readonly record struct TrapezoidalLaw
{
    private TrapezoidalLaw(double distance, double acceleration, double peakSpeed, double accelerationTime, double duration) =>
        (Distance, Acceleration, PeakSpeed, AccelerationTime, Duration) = (distance, acceleration, peakSpeed, accelerationTime, duration);

    /// <summary>Length of the way (m or rad).</summary>
    public double Distance { get; }

    /// <summary>Acceleration and deceleration.</summary>
    public double Acceleration { get; }

    /// <summary>Highest speed reached.</summary>
    public double PeakSpeed { get; }

    /// <summary>Time until the peak is reached (s).</summary>
    public double AccelerationTime { get; }

    /// <summary>Time for the whole way (s): D/V + V/A, or 2 √(D/A) for a triangle.</summary>
    public double Duration { get; }

    /// <summary>The fastest profile within a speed and an acceleration.</summary>
    /// <exception cref="ArgumentOutOfRangeException">A negative distance, or speed or acceleration not above zero.</exception>
    public static TrapezoidalLaw Plan(double distance, double speed, double acceleration)
    {
        if (!(distance >= 0) || !(speed > 0) || !(acceleration > 0))
        {
            throw new ArgumentOutOfRangeException(
                nameof(distance), $"Distance {distance} must be zero or more, speed {speed} and acceleration {acceleration} above zero.");
        }

        if (distance * acceleration < speed * speed)
        {
            var rise = Math.Sqrt(distance / acceleration);
            return new(distance, acceleration, acceleration * rise, rise, 2 * rise);
        }

        return new(distance, acceleration, speed, speed / acceleration, distance / speed + speed / acceleration);
    }

    /// <summary>Distance gone, speed and acceleration at a time since the start (s); held at the ends outside.</summary>
    public LawValue At(double time)
    {
        if (!(time > 0))
        {
            return new(0, 0, time < 0 ? 0 : Acceleration);
        }

        if (time >= Duration)
        {
            return new(Distance, 0, time > Duration ? 0 : -Acceleration);
        }

        if (time < AccelerationTime)
        {
            return new(0.5 * Acceleration * time * time, Acceleration * time, Acceleration);
        }

        var left = Duration - time;
        return left < AccelerationTime
            ? new(Distance - 0.5 * Acceleration * left * left, Acceleration * left, -Acceleration)
            : new(PeakSpeed * (time - 0.5 * AccelerationTime), PeakSpeed, 0);
    }
}
