using PathPortal.Formats.Json;

namespace PathPortal.Formats.Documents;

/// <summary>How a criteria document looks.</summary>
internal static class CriteriaFormat
{
    private static readonly NumberRule Percent = NumberRule.AboveZero("%", 100);

    public static DocumentFormat<CriteriaDocument> Format { get; } = new(CriteriaDocument.FormatName, new Shape<CriteriaDocument>()
        .With(new TextField<CriteriaDocument>("note", TextRule.Note, s => s.Note, (s, v) => s.Note = v))
        .With(Asked("across_tolerance_mm", NumberRule.AboveZero("mm", 1000), s => s.AcrossToleranceMm, (s, v) => s.AcrossToleranceMm = v))
        .With(Given("across_allowance_mm", NumberRule.ZeroOrMore("mm", 1000), s => s.AcrossAllowanceMm, (s, v) => s.AcrossAllowanceMm = v))
        .With(Asked("stand_off_tolerance_mm", NumberRule.AboveZero("mm", 1000), s => s.StandOffToleranceMm, (s, v) => s.StandOffToleranceMm = v))
        .With(Given("stand_off_allowance_mm", NumberRule.ZeroOrMore("mm", 1000), s => s.StandOffAllowanceMm, (s, v) => s.StandOffAllowanceMm = v))
        .With(Asked("axis_tolerance_deg", NumberRule.AboveZero("degrees", 180), s => s.AxisToleranceDeg, (s, v) => s.AxisToleranceDeg = v))
        .With(Given("axis_allowance_deg", NumberRule.ZeroOrMore("degrees", 180), s => s.AxisAllowanceDeg, (s, v) => s.AxisAllowanceDeg = v))
        .With(Asked("tracking_tolerance_mm", NumberRule.AboveZero("mm", 1000), s => s.TrackingToleranceMm, (s, v) => s.TrackingToleranceMm = v))
        .With(Given("tracking_allowance_mm", NumberRule.ZeroOrMore("mm", 1000), s => s.TrackingAllowanceMm, (s, v) => s.TrackingAllowanceMm = v))
        .With(Given("revolute_clearance_deg", NumberRule.AboveZero("degrees", 180), s => s.RevoluteClearanceDeg, (s, v) => s.RevoluteClearanceDeg = v))
        .With(Given("prismatic_clearance_mm", NumberRule.AboveZero("mm", 10_000), s => s.PrismaticClearanceMm, (s, v) => s.PrismaticClearanceMm = v))
        .With(Given("continuous_turns", NumberRule.AboveZero("turns", 1000), s => s.ContinuousTurns, (s, v) => s.ContinuousTurns = v))
        .With(Given("speed_share_percent", Percent, s => s.SpeedSharePercent, (s, v) => s.SpeedSharePercent = v))
        .With(Given("acceleration_share_percent", Percent, s => s.AccelerationSharePercent, (s, v) => s.AccelerationSharePercent = v))
        .With(Given("required_sigma_min", NumberRule.AboveZero("(scaled Jacobian)", 10), s => s.RequiredSigmaMin, (s, v) => s.RequiredSigmaMin = v))
        .With(new FlagField<CriteriaDocument>("singularity_binds", s => s.SingularityBinds, (s, v) => s.SingularityBinds = v))
        .With(Asked("tool_speed_tolerance_percent", NumberRule.AboveZero("%", 1000), s => s.ToolSpeedTolerancePercent, (s, v) => s.ToolSpeedTolerancePercent = v))
        .With(new NearField("near_percent")));

    private static NumberField<CriteriaDocument> Asked(
        string name, NumberRule rule, Func<CriteriaDocument, double?> get, Action<CriteriaDocument, double?> set) =>
        new(name, false, rule, get, set);

    private static NumberField<CriteriaDocument> Given(
        string name, NumberRule rule, Func<CriteriaDocument, double?> get, Action<CriteriaDocument, double> set) =>
        new(name, true, rule, get, (s, v) => set(s, v ?? 0));
}
