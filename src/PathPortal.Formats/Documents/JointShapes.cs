using System.Globalization;
using PathPortal.Engine.Arms;
using PathPortal.Formats.Json;
using PathPortal.Formats.Problems;

namespace PathPortal.Formats.Documents;

/// <summary>How joints and their limits look in arm documents; units follow the kind of joint, geometry the kinematics of the arm.</summary>
internal static class JointShapes
{
    private static readonly Shape<JointLimitsDocument> Revolute = Limits("deg", "degrees", 36_000, turning: true);
    private static readonly Shape<JointLimitsDocument> Prismatic = Limits("mm", "mm", PoseShapes.FarthestMm, turning: false);
    private static readonly Shape<JointDocument> Dh = End(DhRow(Start()));
    private static readonly Shape<JointDocument> Frames = End(Frame(Start()));

    public static Shape<JointDocument> For(ArmKinematics kinematics) => kinematics == ArmKinematics.JointFrames ? Frames : Dh;

    private static Shape<JointDocument> Start() => new Shape<JointDocument>()
        .With(new TextField<JointDocument>("name", TextRule.Name, j => j.Name, (j, v) => j.Name = v))
        .With(new ChoiceField<JointDocument, JointKind>("kind", Words.All<JointKind>(), j => j.Kind, (j, v) => j.Kind = v))
        .With(new IntegerField<JointDocument>("sign", -1, 1, "other than 0", j => j.Sign, (j, v) => j.Sign = v, also: v => v != 0));

    private static Shape<JointDocument> DhRow(Shape<JointDocument> shape) => shape
        .With(new NumberField<JointDocument>(
            "theta_deg", true, NumberRule.Any("degrees", 720), j => j.ThetaDeg, (j, v) => j.ThetaDeg = v ?? 0))
        .With(new NumberField<JointDocument>("d_mm", true, NumberRule.Any("mm", PoseShapes.FarthestMm), j => j.DMm, (j, v) => j.DMm = v ?? 0))
        .With(new NumberField<JointDocument>("a_mm", true, NumberRule.Any("mm", PoseShapes.FarthestMm), j => j.AMm, (j, v) => j.AMm = v ?? 0))
        .With(new NumberField<JointDocument>(
            "alpha_deg", true, NumberRule.Any("degrees", 720), j => j.AlphaDeg, (j, v) => j.AlphaDeg = v ?? 0));

    private static Shape<JointDocument> Frame(Shape<JointDocument> shape) => shape
        .With(new ObjectField<JointDocument, PoseDocument>("pose_in_link_before", true, _ => PoseShapes.Pose, j => j.Pose, (j, v) => j.Pose = v))
        .With(new NumbersField<JointDocument>(
            "axis", 3, NumberRule.Any("", 1e6), j => [j.AxisX, j.AxisY, j.AxisZ],
            (j, v) => (j.AxisX, j.AxisY, j.AxisZ) = (v[0], v[1], v[2])))
        .With(new NumberField<JointDocument>("zero_deg", true, NumberRule.Any("degrees", 36_000), j => j.Zero, (j, v) => j.Zero = v ?? 0), IsRevolute)
        .With(
            new NumberField<JointDocument>("zero_mm", true, NumberRule.Any("mm", PoseShapes.FarthestMm), j => j.Zero, (j, v) => j.Zero = v ?? 0),
            j => !IsRevolute(j))
        .Rule((j, path, problems) =>
        {
            var length = Math.Sqrt(j.AxisX * j.AxisX + j.AxisY * j.AxisY + j.AxisZ * j.AxisZ);
            if (!(length > 1e-9))
            {
                problems.Add(
                    0, 0, path + ".axis", "length " + length.ToString("R", CultureInfo.InvariantCulture), "a direction",
                    "The axis has no direction.");
            }
        });

    private static Shape<JointDocument> End(Shape<JointDocument> shape) => shape.With(new ObjectField<JointDocument, JointLimitsDocument>(
        "limits", true, j => IsRevolute(j) ? Revolute : Prismatic, j => j.Limits, (j, v) => j.Limits = v));

    private static bool IsRevolute(JointDocument joint) => joint.Kind == JointKind.Revolute;

    private static Shape<JointLimitsDocument> Limits(string unit, string words, double most, bool turning)
    {
        var shape = new Shape<JointLimitsDocument>();
        if (turning)
        {
            shape.With(new FlagField<JointLimitsDocument>("continuous", l => l.Continuous, (l, v) => l.Continuous = v));
        }

        return shape
            .With(Limit("low", unit, NumberRule.Any(words, most), l => l.Low, (l, v) => l.Low = v))
            .With(Limit("high", unit, NumberRule.Any(words, most), l => l.High, (l, v) => l.High = v))
            .With(Limit("speed", unit + "_s", NumberRule.AboveZero(words + "/s"), l => l.Speed, (l, v) => l.Speed = v))
            .With(Limit("acceleration", unit + "_s2", NumberRule.AboveZero(words + "/s²", 1e8), l => l.Acceleration, (l, v) => l.Acceleration = v))
            .With(Limit("jerk", unit + "_s3", NumberRule.AboveZero(words + "/s³", 1e10), l => l.Jerk, (l, v) => l.Jerk = v))
            .Rule((l, path, problems) => CheckOrder(l, path, unit, turning, problems));
    }

    private static ObjectField<JointLimitsDocument, LimitDocument> Limit(
        string name, string unit, NumberRule rule,
        Func<JointLimitsDocument, LimitDocument?> get, Action<JointLimitsDocument, LimitDocument> set)
    {
        var shape = new Shape<LimitDocument>()
            .With(new NumberField<LimitDocument>(unit, true, rule, l => l.Value, (l, v) => l.Value = v ?? 0))
            .With(new TextField<LimitDocument>("source", TextRule.Source, l => l.Source, (l, v) => l.Source = v));
        return new(name, false, _ => shape, get, set);
    }

    private static void CheckOrder(JointLimitsDocument limits, string path, string unit, bool turning, ProblemList problems)
    {
        if (turning && limits.Continuous && (limits.Low ?? limits.High) is not null)
        {
            problems.Add(
                0, 0, path + (limits.Low is null ? ".high" : ".low"), "", "no low and no high",
                "A joint that turns without end has no position limits.");
        }
        else if (!turning && limits.Continuous)
        {
            problems.Add(0, 0, path + ".continuous", "true", "false", "Only a revolute joint can turn without end.");
        }
        else if ((limits.Low is null) != (limits.High is null))
        {
            problems.Add(0, 0, path, "", "low and high, or neither", "One position limit is given and the other is not.");
        }
        else if (limits.Low is not null && limits.High is not null && !(limits.Low.Value < limits.High.Value))
        {
            problems.Add(
                0, 0, $"{path}.high.{unit}", limits.High.Value.ToString("R", CultureInfo.InvariantCulture),
                string.Create(CultureInfo.InvariantCulture, $"a number above low, {limits.Low.Value} {unit}"),
                "The high limit is not above the low one.");
        }
    }
}
