using PathPortal.Engine.Paths;

namespace PathPortal.Engine.Control;

/// <summary>How the cell's controller follows a path: the closed loop, its solver, its servo and what it does at a limit. SI, immutable.</summary>
public sealed record ControllerSettings
{
    /// <summary>Control period T (s), above zero.</summary>
    public required double Period { get; init; }

    /// <summary>Gain on the position error (1/s).</summary>
    public required double PositionGain { get; init; }

    /// <summary>Gain on the orientation error (1/s).</summary>
    public required double OrientationGain { get; init; }

    public Feedforward Feedforward { get; init; } = Feedforward.Middle;

    public Damping Damping { get; init; } = Damping.None;

    /// <summary>Gain k₀ (1/s) of the null-space motion towards the middle of each joint's range; 0 for none. Acts only where directions are free.</summary>
    public double MidRangeGain { get; init; }

    /// <summary>Time constant of the first-order joint servo (s); 0 for an ideal integrator.</summary>
    public double ServoTimeConstant { get; init; }

    /// <summary>Which joint values close the loop.</summary>
    public FeedbackSource Feedback { get; init; } = FeedbackSource.Measured;

    /// <summary>Delay of the measured joints, whole periods, 0..64.</summary>
    public int MeasurementDelay { get; init; }

    /// <summary>Delay of the joint speed command, whole periods, 0..64.</summary>
    public int CommandDelay { get; init; }

    /// <summary>The controller holds joint speeds at their limits.</summary>
    public bool LimitsSpeed { get; init; } = true;

    /// <summary>The controller holds joint accelerations at their limits.</summary>
    public bool LimitsAcceleration { get; init; }

    public SpeedLimiter SpeedLimiter { get; init; } = SpeedLimiter.CommonScaling;

    public LimitReaction LimitReaction { get; init; } = LimitReaction.KeepTime;

    public TimeLaw TimeLaw { get; init; } = TimeLaw.Trapezoidal;

    /// <summary>Tool acceleration along the path (m/s²), above zero; also bounds v²/ρ in rounded corners.</summary>
    public required double ToolAcceleration { get; init; }

    /// <summary>Fastest tool turn along the path (rad/s), above zero.</summary>
    public required double ToolTurnSpeed { get; init; }

    /// <summary>Angular tool acceleration for turns on the spot (rad/s²), above zero.</summary>
    public required double ToolTurnAcceleration { get; init; }
}
