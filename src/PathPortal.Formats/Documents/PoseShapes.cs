using PathPortal.Formats.Json;

namespace PathPortal.Formats.Documents;

/// <summary>How poses and measured poses look in documents.</summary>
internal static class PoseShapes
{
    /// <summary>Farthest coordinate in a document: beyond it somebody mixed up units.</summary>
    public const double FarthestMm = 100_000;

    private static readonly Shape<OrientationDocument> Orientation = new Shape<OrientationDocument>()
        .With(new ChoiceField<OrientationDocument, string>(
            "convention", [.. OrientationConvention.Words.Select(w => (w, w))], o => o.Convention, (o, v) => o.Convention = v))
        .With(
            new NumbersField<OrientationDocument>(
                "angles_deg", 3, NumberRule.Any("degrees", 720), o => [o.FirstDeg, o.SecondDeg, o.ThirdDeg],
                (o, v) => (o.FirstDeg, o.SecondDeg, o.ThirdDeg) = (v[0], v[1], v[2])),
            o => !o.IsQuaternion)
        .With(
            new NumbersField<OrientationDocument>(
                "wxyz", 4, NumberRule.Any("", 1e3), o => [o.W, o.X, o.Y, o.Z], (o, v) => (o.W, o.X, o.Y, o.Z) = (v[0], v[1], v[2], v[3])),
            o => o.IsQuaternion)
        .Rule((o, path, problems) =>
        {
            var norm = Math.Sqrt(o.W * o.W + o.X * o.X + o.Y * o.Y + o.Z * o.Z);
            if (o.IsQuaternion && !(norm > 1e-6))
            {
                problems.Add(0, 0, path + ".wxyz", "norm " + norm.ToString("R", System.Globalization.CultureInfo.InvariantCulture),
                    "a quaternion with a norm near 1", "The quaternion has no direction.");
            }
        });

    public static Shape<PoseDocument> Pose { get; } = new Shape<PoseDocument>()
        .With(new NumbersField<PoseDocument>(
            "position_mm", 3, NumberRule.Any("mm", FarthestMm), p => [p.XMm, p.YMm, p.ZMm],
            (p, v) => (p.XMm, p.YMm, p.ZMm) = (v[0], v[1], v[2])))
        .With(new ObjectField<PoseDocument, OrientationDocument>(
            "orientation", true, _ => Orientation, p => p.Orientation, (p, v) => p.Orientation = v));

    /// <summary>A measured pose whose property says in which frame it is.</summary>
    public static Shape<MeasuredPoseDocument> Measured(string poseName, bool named)
    {
        var shape = new Shape<MeasuredPoseDocument>();
        if (named)
        {
            shape.With(new TextField<MeasuredPoseDocument>("name", TextRule.Name, p => p.Name, (p, v) => p.Name = v));
        }

        return shape
            .With(new ChoiceField<MeasuredPoseDocument, MeasuredHow>("how", Words.All<MeasuredHow>(), p => p.How, (p, v) => p.How = v))
            .With(new TextField<MeasuredPoseDocument>("detail", TextRule.Line, p => p.Detail, (p, v) => p.Detail = v))
            .With(new ObjectField<MeasuredPoseDocument, PoseDocument>(poseName, true, _ => Pose, p => p.Pose, (p, v) => p.Pose = v));
    }
}
