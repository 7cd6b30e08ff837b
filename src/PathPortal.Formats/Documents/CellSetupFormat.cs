using PathPortal.Engine.Control;
using PathPortal.Engine.Paths;
using PathPortal.Formats.Json;

namespace PathPortal.Formats.Documents;

/// <summary>How a cell-setup document looks.</summary>
internal static class CellSetupFormat
{
    private const int MostNamed = 100;

    private static readonly Shape<MeasuredPoseDocument> BaseShape = PoseShapes.Measured("pose_in_cell", named: false);
    private static readonly Shape<MeasuredPoseDocument> ToolShape = PoseShapes.Measured("pose_in_flange", named: true);
    private static readonly Shape<MeasuredPoseDocument> FrameShape = PoseShapes.Measured("pose_in_cell", named: true);

    private static readonly Shape<ControllerDocument> Controller = new Shape<ControllerDocument>()
        .With(Number("period_ms", NumberRule.AboveZero("ms", 100), c => c.PeriodMs, (c, v) => c.PeriodMs = v))
        .With(Number("position_gain_per_s", NumberRule.ZeroOrMore("1/s", 1e5), c => c.PositionGainPerS, (c, v) => c.PositionGainPerS = v))
        .With(Number("orientation_gain_per_s", NumberRule.ZeroOrMore("1/s", 1e5), c => c.OrientationGainPerS, (c, v) => c.OrientationGainPerS = v))
        .With(Choice("feedforward", c => c.Feedforward, (c, v) => c.Feedforward = v))
        .With(Choice("damping", c => c.Damping, (c, v) => c.Damping = v))
        .With(
            Number("damping_lambda", NumberRule.AboveZero("(scaled Jacobian)", 10), c => c.DampingLambda, (c, v) => c.DampingLambda = v),
            c => c.Damping != DampingKind.None)
        .With(
            Number("damping_epsilon", NumberRule.AboveZero("(scaled Jacobian)", 10), c => c.DampingEpsilon, (c, v) => c.DampingEpsilon = v),
            c => c.Damping == DampingKind.Variable)
        .With(Number("mid_range_gain_per_s", NumberRule.ZeroOrMore("1/s", 1e3), c => c.MidRangeGainPerS, (c, v) => c.MidRangeGainPerS = v))
        .With(Number("servo_time_constant_ms", NumberRule.ZeroOrMore("ms", 1e4), c => c.ServoTimeConstantMs, (c, v) => c.ServoTimeConstantMs = v))
        .With(Choice("feedback", c => c.Feedback, (c, v) => c.Feedback = v))
        .With(new IntegerField<ControllerDocument>(
            "measurement_delay_periods", 0, 64, "periods", c => c.MeasurementDelayPeriods, (c, v) => c.MeasurementDelayPeriods = v))
        .With(new IntegerField<ControllerDocument>(
            "command_delay_periods", 0, 64, "periods", c => c.CommandDelayPeriods, (c, v) => c.CommandDelayPeriods = v))
        .With(new FlagField<ControllerDocument>("limits_speed", c => c.LimitsSpeed, (c, v) => c.LimitsSpeed = v))
        .With(new FlagField<ControllerDocument>("limits_acceleration", c => c.LimitsAcceleration, (c, v) => c.LimitsAcceleration = v))
        .With(Choice("speed_limiter", c => c.SpeedLimiter, (c, v) => c.SpeedLimiter = v))
        .With(Choice("limit_reaction", c => c.LimitReaction, (c, v) => c.LimitReaction = v))
        .With(Choice<TimeLaw>("time_law", c => c.TimeLaw, (c, v) => c.TimeLaw = v))
        .With(Number("tool_acceleration_mm_s2", NumberRule.AboveZero("mm/s²"), c => c.ToolAccelerationMmS2, (c, v) => c.ToolAccelerationMmS2 = v))
        .With(Number("tool_turn_speed_deg_s", NumberRule.AboveZero("degrees/s"), c => c.ToolTurnSpeedDegS, (c, v) => c.ToolTurnSpeedDegS = v))
        .With(Number(
            "tool_turn_acceleration_deg_s2", NumberRule.AboveZero("degrees/s²"), c => c.ToolTurnAccelerationDegS2,
            (c, v) => c.ToolTurnAccelerationDegS2 = v));

    public static DocumentFormat<CellSetupDocument> Format { get; } = new(CellSetupDocument.FormatName, new Shape<CellSetupDocument>()
        .With(new TextField<CellSetupDocument>("note", TextRule.Note, s => s.Note, (s, v) => s.Note = v))
        .With(new ObjectField<CellSetupDocument, MeasuredPoseDocument>("base", true, _ => BaseShape, s => s.Base, (s, v) => s.Base = v))
        .With(new ListField<CellSetupDocument, MeasuredPoseDocument>("tools", 1, MostNamed, "tools", _ => ToolShape, s => s.Tools, t => t.Name))
        .With(new ListField<CellSetupDocument, MeasuredPoseDocument>("frames", 1, MostNamed, "work frames", _ => FrameShape, s => s.Frames, f => f.Name))
        .With(new ObjectField<CellSetupDocument, ControllerDocument>(
            "controller", true, _ => Controller, s => s.Controller, (s, v) => s.Controller = v)));

    private static NumberField<ControllerDocument> Number(
        string name, NumberRule rule, Func<ControllerDocument, double?> get, Action<ControllerDocument, double> set) =>
        new(name, true, rule, get, (c, v) => set(c, v ?? 0));

    private static ChoiceField<ControllerDocument, TEnum> Choice<TEnum>(
        string name, Func<ControllerDocument, TEnum> get, Action<ControllerDocument, TEnum> set)
        where TEnum : struct, Enum => new(name, Words.All<TEnum>(), get, set);
}
