using PathPortal.Engine.Verdicts;

namespace PathPortal.Formats.Documents;

/// <summary>Criteria documents as sheets for the engine.</summary>
internal static class CriteriaConversion
{
    public static CriteriaSheet ToCriteriaSheet(CriteriaDocument s) => new()
    {
        AcrossTolerance = Metres(s.AcrossToleranceMm),
        AcrossAllowance = Conversion.Metres(s.AcrossAllowanceMm),
        StandOffTolerance = Metres(s.StandOffToleranceMm),
        StandOffAllowance = Conversion.Metres(s.StandOffAllowanceMm),
        AxisTolerance = s.AxisToleranceDeg is { } angle ? Conversion.Radians(angle) : null,
        AxisAllowance = Conversion.Radians(s.AxisAllowanceDeg),
        TrackingTolerance = Metres(s.TrackingToleranceMm),
        TrackingAllowance = Conversion.Metres(s.TrackingAllowanceMm),
        RevoluteClearance = Conversion.Radians(s.RevoluteClearanceDeg),
        PrismaticClearance = Conversion.Metres(s.PrismaticClearanceMm),
        ContinuousTurns = s.ContinuousTurns,
        SpeedShare = s.SpeedSharePercent / 100,
        AccelerationShare = s.AccelerationSharePercent / 100,
        RequiredSigmaMin = s.RequiredSigmaMin,
        SingularityBinds = s.SingularityBinds,
        ToolSpeedTolerance = s.ToolSpeedTolerancePercent / 100,
        Near = s.NearPercent.ToDictionary(n => n.Key, n => n.Value / 100),
    };

    private static double? Metres(double? mm) => mm is { } value ? Conversion.Metres(value) : null;
}
