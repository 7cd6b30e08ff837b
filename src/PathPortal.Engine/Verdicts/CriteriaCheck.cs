namespace PathPortal.Engine.Verdicts;

/// <summary>Checks a criteria sheet for what no run can be judged by.</summary>
internal static class CriteriaCheck
{
    public static void Check(CriteriaSheet criteria, InputCheck check)
    {
        const string place = "criteria";
        Tolerance("across tolerance", criteria.AcrossTolerance, criteria.AcrossAllowance, "m", check);
        Tolerance("stand-off tolerance", criteria.StandOffTolerance, criteria.StandOffAllowance, "m", check);
        Tolerance("tool axis tolerance", criteria.AxisTolerance, criteria.AxisAllowance, "rad", check);
        Tolerance("tracking tolerance", criteria.TrackingTolerance, criteria.TrackingAllowance, "m", check);
        check.Above(place, "clearance of revolute joints", criteria.RevoluteClearance, 0, "rad");
        check.Above(place, "clearance of prismatic joints", criteria.PrismaticClearance, 0, "m");
        check.Above(place, "turns of continuous joints", criteria.ContinuousTurns, 0, "1");
        check.Share(place, "speed share", criteria.SpeedShare);
        check.Share(place, "acceleration share", criteria.AccelerationShare);
        check.Above(place, "required σ_min", criteria.RequiredSigmaMin, 0, "1");
        if (criteria.ToolSpeedTolerance is { } speed)
        {
            check.Above(place, "tool speed tolerance", speed, 0, "1");
        }

        foreach (var (criterion, near) in criteria.Near.OrderBy(n => n.Key))
        {
            check.Known(place, "near threshold, criterion", criterion);
            check.Share(place, $"near threshold of {criterion}", near);
        }
    }

    private static void Tolerance(string quantity, double? tolerance, double allowance, string unit, InputCheck check)
    {
        check.NotNegative("criteria", quantity + ", allowance", allowance, unit);
        if (tolerance is { } given)
        {
            check.Above("criteria", quantity, given, 0, unit);
        }
    }
}
