using PathPortal.Engine.Arms;
using PathPortal.Formats.Documents;

namespace PathPortal.Formats.Tests.Documents;

/// <summary>Invented documents the tests start from.</summary>
internal static class InventedDocuments
{
    /// <summary>Invented six-joint arm, standard DH, metre and degree: a, alpha, d as below.</summary>
    public static ArmDocument Arm()
    {
        double[] a = [50, 420, 30, 0, 0, 0];
        double[] alpha = [90, 0, 90, -90, 90, 0];
        double[] d = [400, 0, 0, 380, 0, 90];
        return new()
        {
            Name = "Invented six-joint arm",
            Note = "Invented.",
            Kinematics = ArmKinematics.DhStandard,
            Joints = [.. Enumerable.Range(0, 6).Select(i => new JointDocument
            {
                Name = $"J{i + 1}",
                AMm = a[i],
                AlphaDeg = alpha[i],
                DMm = d[i],
                Limits = new()
                {
                    Low = new() { Value = -170, Source = "invented" },
                    High = new() { Value = 170, Source = "invented" },
                    Speed = new() { Value = 220.5, Source = "invented" },
                },
            })],
        };
    }

    public static ArmDocument FramesArm() => new()
    {
        Name = "Invented slide and turn",
        Kinematics = ArmKinematics.JointFrames,
        CharacteristicLengthMm = 500,
        Joints =
        [
            new()
            {
                Name = "slide", Kind = JointKind.Prismatic, AxisX = 1, AxisZ = 0, Zero = 5, Sign = -1,
                Limits = new() { Low = new() { Value = 0, Source = "invented" }, High = new() { Value = 300, Source = "invented" } },
            },
            new()
            {
                Name = "turn", AxisX = 1, AxisY = 1, Zero = -30, Limits = new() { Continuous = true },
                Pose = new() { ZMm = 250, Orientation = new() { Convention = "moving_zyz", FirstDeg = 10, SecondDeg = 20, ThirdDeg = 30 } },
            },
        ],
        Flange = new() { Orientation = OrientationDocument.FromQuaternion(Engine.Geometry.UnitQuaternion.FromComponents(1, 2, 3, 4)) },
    };

    public static CellSetupDocument Setup() => new()
    {
        Note = "Invented.\nTwo lines.",
        Base = new() { How = MeasuredHow.Surveyed, Detail = "invented", Pose = new() { XMm = 1000, Orientation = new() { ThirdDeg = 90 } } },
        Tools = [new() { Name = "nozzle", Pose = new() { ZMm = 120 } }, new() { Name = "bent nozzle", Pose = new() { XMm = 30, ZMm = 120 } }],
        Frames = [new() { Name = "fixture A", How = MeasuredHow.Taught, Pose = new() { XMm = 600.1, YMm = -0.3 } }],
    };

    public static CriteriaDocument Criteria() => new()
    {
        AcrossToleranceMm = 0.5,
        AcrossAllowanceMm = 0.1,
        AxisToleranceDeg = 2,
        SingularityBinds = true,
        NearPercent = { [Engine.Verdicts.Criterion.JointSpeed] = 85 },
    };
}
