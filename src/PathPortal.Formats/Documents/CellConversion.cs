using PathPortal.Engine.Control;

namespace PathPortal.Formats.Documents;

/// <summary>Controller documents as settings for the engine.</summary>
internal static class CellConversion
{
    public static ControllerSettings ToControllerSettings(ControllerDocument c) => new()
    {
        Period = c.PeriodMs / 1000,
        PositionGain = c.PositionGainPerS,
        OrientationGain = c.OrientationGainPerS,
        Feedforward = c.Feedforward,
        Damping = c.Damping switch
        {
            DampingKind.Constant => Damping.Constant(c.DampingLambda),
            DampingKind.Variable => Damping.Variable(c.DampingLambda, c.DampingEpsilon),
            _ => Damping.None,
        },
        MidRangeGain = c.MidRangeGainPerS,
        ServoTimeConstant = c.ServoTimeConstantMs / 1000,
        Feedback = c.Feedback,
        MeasurementDelay = c.MeasurementDelayPeriods,
        CommandDelay = c.CommandDelayPeriods,
        LimitsSpeed = c.LimitsSpeed,
        LimitsAcceleration = c.LimitsAcceleration,
        SpeedLimiter = c.SpeedLimiter,
        LimitReaction = c.LimitReaction,
        TimeLaw = c.TimeLaw,
        ToolAcceleration = Conversion.Metres(c.ToolAccelerationMmS2),
        ToolTurnSpeed = Conversion.Radians(c.ToolTurnSpeedDegS),
        ToolTurnAcceleration = Conversion.Radians(c.ToolTurnAccelerationDegS2),
    };
}
