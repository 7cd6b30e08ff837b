namespace PathPortal.Engine.Control;

/// <summary>Checks controller settings for what no simulation can run on.</summary>
internal static class ControllerCheck
{
    private const int MostDelay = 64;
    private const double LongestPeriod = 1; // s

    public static void Check(ControllerSettings controller, InputCheck check)
    {
        const string place = "controller";
        check.Above(place, "period", controller.Period, 0, "s");
        if (controller.Period > LongestPeriod)
        {
            check.Add(place, "period", controller.Period, "s", $"must be at most {LongestPeriod} s");
        }

        check.NotNegative(place, "position gain", controller.PositionGain, "1/s");
        check.NotNegative(place, "orientation gain", controller.OrientationGain, "1/s");
        check.NotNegative(place, "mid-range gain", controller.MidRangeGain, "1/s");
        check.NotNegative(place, "servo time constant", controller.ServoTimeConstant, "s");
        check.Between(place, "measurement delay", controller.MeasurementDelay, 0, MostDelay);
        check.Between(place, "command delay", controller.CommandDelay, 0, MostDelay);
        check.Above(place, "tool acceleration", controller.ToolAcceleration, 0, "m/s²");
        check.Above(place, "tool turn speed", controller.ToolTurnSpeed, 0, "rad/s");
        check.Above(place, "tool turn acceleration", controller.ToolTurnAcceleration, 0, "rad/s²");
        check.Known(place, "feedforward", controller.Feedforward);
        check.Known(place, "feedback", controller.Feedback);
        check.Known(place, "speed limiter", controller.SpeedLimiter);
        check.Known(place, "limit reaction", controller.LimitReaction);
        check.Known(place, "time law", controller.TimeLaw);
        check.Known(place, "damping", controller.Damping.Kind);
        if (controller.Damping.Kind != DampingKind.None)
        {
            check.Above(place, "damping λ", controller.Damping.Lambda, 0, "1");
        }

        if (controller.Damping.Kind == DampingKind.Variable)
        {
            check.Above(place, "damping ε", controller.Damping.Epsilon, 0, "1");
        }
    }
}
