using PathPortal.Engine.Control;
using PathPortal.Engine.Paths;

namespace PathPortal.Formats.Documents;

/// <summary>How a cell's controller follows a path, as people write it. The starting values are common practice, no source.</summary>
public sealed record ControllerDocument
{
    /// <summary>Control period.</summary>
    public double PeriodMs { get; set; } = 4;

    /// <summary>Gain on the position error (1/s).</summary>
    public double PositionGainPerS { get; set; } = 10;

    /// <summary>Gain on the orientation error (1/s).</summary>
    public double OrientationGainPerS { get; set; } = 10;

    public Feedforward Feedforward { get; set; } = Feedforward.Middle;

    public DampingKind Damping { get; set; } = DampingKind.Variable;

    /// <summary>λ, or λ_max of the variable law, in units of the scaled Jacobian; counts unless damping is none.</summary>
    public double DampingLambda { get; set; } = 0.05;

    /// <summary>ε of the variable law.</summary>
    public double DampingEpsilon { get; set; } = 0.1;

    /// <summary>Gain of the null-space motion towards mid-range (1/s); 0 for none.</summary>
    public double MidRangeGainPerS { get; set; }

    /// <summary>First-order joint servo; 0 for an ideal one.</summary>
    public double ServoTimeConstantMs { get; set; }

    public FeedbackSource Feedback { get; set; } = FeedbackSource.Measured;

    /// <summary>Whole control periods.</summary>
    public int MeasurementDelayPeriods { get; set; }

    /// <summary>Whole control periods.</summary>
    public int CommandDelayPeriods { get; set; }

    public bool LimitsSpeed { get; set; } = true;

    public bool LimitsAcceleration { get; set; }

    public SpeedLimiter SpeedLimiter { get; set; } = SpeedLimiter.CommonScaling;

    public LimitReaction LimitReaction { get; set; } = LimitReaction.KeepTime;

    public TimeLaw TimeLaw { get; set; } = TimeLaw.Trapezoidal;

    /// <summary>Tool acceleration along the path.</summary>
    public double ToolAccelerationMmS2 { get; set; } = 2000;

    /// <summary>Fastest tool turn along the path.</summary>
    public double ToolTurnSpeedDegS { get; set; } = 90;

    /// <summary>Angular acceleration of turns on the spot.</summary>
    public double ToolTurnAccelerationDegS2 { get; set; } = 360;

    /// <summary>The settings for the engine, SI.</summary>
    public ControllerSettings ToControllerSettings() => CellConversion.ToControllerSettings(this);
}
