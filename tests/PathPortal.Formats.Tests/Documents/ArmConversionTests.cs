using PathPortal.Engine.Arms;
using PathPortal.Engine.Geometry;
using PathPortal.Formats.Documents;

namespace PathPortal.Formats.Tests.Documents;

public sealed class ArmConversionTests
{
    // A handful of products and sums of numbers near 1, printed with ten digits at worst.
    private const double PrintedTolerance = 1e-9;
    private const double PoseTolerance = 1e-12;

    [Fact]
    public void ToArmModel_OfStandardRows_HasTheReferencePose()
    {
        var arm = InventedDocuments.Arm().ToArmModel();
        var X = ArmPose.Compute(arm, [.. new double[] { 10, 60, 10, 15, -65, 25 }.Select(d => d * Math.PI / 180)])
            .Tool(RigidTransform.FromTranslation(0, 0, 0.12));

        // Invented arm; numpy, and Orocos KDL identical.
        AssertPose(
            [0.9360048674, -0.3475838828, 0.05550074421, 0.6294681945, -0.3501351393, -0.9032795673, 0.2479746106, 0.1610117759, -0.03605928978, -0.2515382034, -0.9671754028, 0.4588469592],
            X, PrintedTolerance);
    }

    [Fact]
    public void ToArmModel_OfModifiedRows_HasTheTextbookPose()
    {
        double[] a = [0, 0, 450, 20, 0, 0], alpha = [0, -90, 0, -90, 90, -90], d = [0, 0, 120, 420, 0, 0];
        var arm = new ArmDocument
        {
            Name = "modified rows",
            Kinematics = ArmKinematics.DhModified,
            Joints = [.. Enumerable.Range(0, 6).Select(i => new JointDocument { Name = $"J{i + 1}", AMm = a[i], AlphaDeg = alpha[i], DMm = d[i] })],
        };

        var X = ArmPose.Compute(
            arm.ToArmModel(), [0.4363323129985824, -0.6108652381980153, 0.6981317007977318, 0.9599310885968813, -1.1344640137963142, 1.3962634015954636]).Flange;

        // J. Craig, Introduction to Robotics, ch. 3, the worked six-joint arm with other lengths; numpy and Orocos KDL.
        AssertPose(
            [-0.4137806502388828, -0.5164496277200484, 0.7497101810137772, 0.2682489633629568, -0.8825355070725729, 0.025452372368441584, -0.4695564454854972, 0.25749189618378543, 0.2234203487689599, -0.8559392260953118, -0.46631683326609036, -0.16203549169551545],
            X, PoseTolerance);
    }

    [Fact]
    public void ToArmModel_WithSignsOffsetsASlideBaseAndTool_HasTheReferencePose()
    {
        var arm = new ArmDocument
        {
            Name = "signs and offsets",
            Joints =
            [
                new() { Name = "J1", AMm = 100, AlphaDeg = 90, DMm = 300, Sign = -1, ThetaDeg = 90 },
                new() { Name = "J2", AMm = 400, ThetaDeg = -90 },
                new() { Name = "J3", Kind = JointKind.Prismatic, DMm = 350, Sign = -1 },
            ],
        };
        var setup = InventedDocuments.Setup();
        setup.Base.Pose = new() { XMm = 1000, YMm = 2000, ZMm = 500, Orientation = new() { ThirdDeg = 30 } };
        setup.Tools[0].Pose = new()
        {
            XMm = 10,
            YMm = 20,
            ZMm = 130,
            Orientation = new() { FirstDeg = 0.1 * 180 / Math.PI, SecondDeg = -0.2 * 180 / Math.PI, ThirdDeg = 0.3 * 180 / Math.PI },
        };
        var cell = setup.ToCellGeometry("nozzle", "fixture A");

        var X = cell.BaseInCell * ArmPose.Compute(arm.ToArmModel(), [0.2617993877991494, 1.2217304763960306, 0.05]).Tool(cell.ToolInFlange);

        // Joint variable = sign · value + offset; numpy and Orocos KDL.
        AssertPose(
            [-0.06145478182808514, 0.0870059950773927, 0.9943104478034289, 1.2879795320673253, 0.9969517181765374, 0.05332705448532729, 0.056951706601021834, 2.5866381760020287, -0.04806850752116602, 0.9947794640424136, -0.0900179787829962, 0.678565593652194],
            X, PoseTolerance);
    }

    [Fact]
    public void ToArmModel_OfLimits_IsInRadiansAndMetres()
    {
        var joints = InventedDocuments.FramesArm().ToArmModel().Joints;

        Assert.Equal((0.0, 0.3, "invented"), (joints[0].Limits.Low!.Value.Value, joints[0].Limits.High!.Value.Value, joints[0].Limits.High!.Value.Source));
        Assert.Equal((-1, 0.005), (joints[0].Sign, joints[0].Zero));
        Assert.Equal(-Math.PI / 6, joints[1].Zero, PoseTolerance);
        Assert.True(joints[1].Limits.Continuous);
        Assert.Equal(220.5 * Math.PI / 180, InventedDocuments.Arm().ToArmModel().Joints[0].Limits.Speed!.Value.Value, PoseTolerance);
    }

    [Fact]
    public void ToControllerSettings_OfTheForm_IsInSi()
    {
        var settings = new ControllerDocument { ServoTimeConstantMs = 20 }.ToControllerSettings();

        Assert.Equal((0.004, 0.02, 2.0), (settings.Period, settings.ServoTimeConstant, settings.ToolAcceleration));
        Assert.Equal(Math.PI / 2, settings.ToolTurnSpeed, PoseTolerance);
        Assert.Equal(Engine.Control.Damping.Variable(0.05, 0.1), settings.Damping);
    }

    [Fact]
    public void ToCriteriaSheet_OfTheForm_IsInSiAndKeepsWhatIsNotAsked()
    {
        var sheet = InventedDocuments.Criteria().ToCriteriaSheet();

        Assert.Equal((0.0005, 0.0001, 0.9), (sheet.AcrossTolerance, sheet.AcrossAllowance, sheet.SpeedShare));
        Assert.Equal(2 * Math.PI / 180, sheet.AxisTolerance!.Value, PoseTolerance);
        Assert.Null(sheet.TrackingTolerance);
        Assert.Equal(0.85, sheet.Near[Engine.Verdicts.Criterion.JointSpeed]);
    }

    private static void AssertPose(double[] rows, RigidTransform x, double tolerance)
    {
        double[] actual =
        [
            x.Rotation.R11, x.Rotation.R12, x.Rotation.R13, x.Translation.X,
            x.Rotation.R21, x.Rotation.R22, x.Rotation.R23, x.Translation.Y,
            x.Rotation.R31, x.Rotation.R32, x.Rotation.R33, x.Translation.Z,
        ];
        for (var i = 0; i < 12; i++)
        {
            Assert.Equal(rows[i], actual[i], tolerance);
        }
    }
}
