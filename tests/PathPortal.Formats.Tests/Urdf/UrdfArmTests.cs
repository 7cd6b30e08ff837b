using PathPortal.Engine.Arms;
using PathPortal.Engine.Geometry;
using PathPortal.Formats.Documents;
using PathPortal.Formats.Urdf;

namespace PathPortal.Formats.Tests.Urdf;

public sealed class UrdfArmTests
{
    // Sums of products of a few numbers near 1.
    private const double PoseTolerance = 1e-11;

    [Fact]
    public void Read_OfTheQuirkyFile_OrdersLinksByKinematics()
    {
        var model = UrdfModel.Read(QuirkyUrdf.Text).Value!;

        Assert.Equal("quirky", model.Name);
        Assert.Equal("world_plate", model.RootLink);
        Assert.Equal(["world_plate", "base", "turret", "upper", "fore", "wrist", "hand", "tool0"], model.Links);
        Assert.Equal(["tool0"], model.TipLinks);
    }

    [Fact]
    public void ToArm_OfTheQuirkyFile_HasTheReferencePoseAndJacobian()
    {
        var arm = UrdfModel.Read(QuirkyUrdf.Text).Value!.ToArm(freeMimicJoints: true).Value!.ToArmModel();

        // "echo" follows a_wrist: -0.5 · 0.9 + 0.1.
        double[] q = [0.5, -0.4, 0.12, 0.9, -0.35];
        var X_BF = ArmPose.Compute(arm, q).Flange;
        var j = GeometricJacobian.Compute(arm, q, RigidTransform.Identity);

        Assert.Equal(["z_turn", "b_lift", "slide", "a_wrist", "echo"], arm.Joints.Select(x => x.Name));

        // numpy, Orocos KDL and central differences agree on these.
        AssertRow([-0.8273035000701109, 0.19150925258214127, -0.5281033279076868, -0.3374074504435853], X_BF.Rotation.R11, X_BF.Rotation.R12, X_BF.Rotation.R13, X_BF.Translation.X);
        AssertRow([-0.33867609658476994, 0.5799937870747529, 0.7408817102323354, 0.15912904148404516], X_BF.Rotation.R21, X_BF.Rotation.R22, X_BF.Rotation.R23, X_BF.Translation.Y);
        AssertRow([0.44818235169833215, 0.7917900057023428, -0.41497128394147537, 0.48983364491314463], X_BF.Rotation.R31, X_BF.Rotation.R32, X_BF.Rotation.R33, X_BF.Translation.Z);
        double[][] reference =
        [
            [-0.15912904148404516, -0.03924222009917665, -0.9252615380492619, 0.027632736264344978],
            [-0.3374074504435853, -0.007762125969692529, 0.14555166616683263, 0.049414760538542116],
            [0.0, -0.13159651828856161, -0.3502938747434398, 0.0300237704887504],
            [0.0, -0.9170129595005163, 0.0, 0.9754646539730885],
            [0.0, -0.2742298266025698, 0.0, -0.2504871954037245],
            [1.0, 0.28962947762551555, 0.0, -0.4855150603101197],
        ];
        for (var row = 0; row < 6; row++)
        {
            AssertRow(reference[row], j[row, 0], j[row, 1], j[row, 2], j[row, 3] - 0.5 * j[row, 4]);
        }
    }

    [Fact]
    public void ToArm_OfTheQuirkyFile_TakesLimitsAsTheFileMeansThem()
    {
        var read = UrdfModel.Read(QuirkyUrdf.Text).Value!.ToArm(tipLink: "wrist");
        var joints = read.Value!.ToArmModel().Joints;

        Assert.True(joints[0].Limits is { Continuous: true, Low: null, High: null });
        AssertRow([2.5], joints[0].Limits.Speed!.Value.Value);
        AssertRow([-1.5, 1.6, 2], joints[1].Limits.Low!.Value.Value, joints[1].Limits.High!.Value.Value, joints[1].Limits.Speed!.Value.Value);
        AssertRow([0, 0.3, 0.5], joints[2].Limits.Low!.Value.Value, joints[2].Limits.High!.Value.Value, joints[2].Limits.Speed!.Value.Value);
        AssertRow([-2, 2, 3], joints[3].Limits.Low!.Value.Value, joints[3].Limits.High!.Value.Value, joints[3].Limits.Speed!.Value.Value);
        Assert.Equal("URDF file", joints[3].Limits.Speed!.Value.Source);
        Assert.Null(joints[3].Limits.Acceleration);
        Assert.Contains(read.Remarks, r => r is { Line: 14, Field: "joint b_lift" } && r.Message.StartsWith("The axis has not length 1", StringComparison.Ordinal));
        Assert.Contains(read.Remarks, r => r.Message.StartsWith("Soft limits -1.4 to 1.5", StringComparison.Ordinal));
        Assert.Contains(read.Remarks, r => r.Field == "joint z_turn" && r.Message.StartsWith("The joint turns without end", StringComparison.Ordinal));
    }

    [Fact]
    public void ToArm_ThroughAJointThatFollowsAnother_IsRefusedWithItsLaw()
    {
        var problem = Assert.Single(UrdfModel.Read(QuirkyUrdf.Text).Value!.ToArm().Problems);

        Assert.Equal((16, 4, "joint echo", "-0.5 × a_wrist + 0.1"), (problem.Line, problem.Column, problem.Field, problem.Value));
    }

    [Fact]
    public void ToArm_OfWhatWasWritten_IsTheSameArm()
    {
        var document = UrdfModel.Read(QuirkyUrdf.Text).Value!.ToArm(freeMimicJoints: true).Value!;

        var read = ArmDocument.Read(document.ToJson()).Value!;

        Assert.Equal(document.ToJson(), read.ToJson());
        Assert.Equal(document.ToArmModel().Joints.AsEnumerable(), read.ToArmModel().Joints);
    }

    [Fact]
    public void ToArm_OfOneJoint_IsOriginThenTurnAboutTheScaledAxis()
    {
        // URDF specification: T = origin · turn about the axis, the axis given in the joint frame. Numbers from numpy.
        var arm = OneJoint("""<origin xyz="0.05 0.1 0" rpy="0.3 -0.2 1.1"/><axis xyz="0 2 0"/><limit lower="-1" upper="1" effort="1" velocity="1"/>""").ToArmModel();

        var X = ArmPose.Compute(arm, [0.7]).Flange;

        AssertRow([0.2258076742846494, -0.8780339023780974, 0.4219802845025432, 0.05], X.Rotation.R11, X.Rotation.R12, X.Rotation.R13, X.Translation.X);
        AssertRow([0.8633689461836851, 0.38101342753905754, 0.3307912193523471, 0.1], X.Rotation.R21, X.Rotation.R22, X.Rotation.R23, X.Translation.Y);
        AssertRow([-0.4512260597525712, 0.28962947762551555, 0.844102960953544, 0], X.Rotation.R31, X.Rotation.R32, X.Rotation.R33, X.Translation.Z);
    }

    [Fact]
    public void ToArm_WithoutAxis_TurnsAboutX()
    {
        // URDF specification: a missing axis means (1, 0, 0).
        var arm = OneJoint("""<limit lower="-1" upper="1" effort="1" velocity="1"/>""").ToArmModel();

        Assert.Equal(Math.Sin(0.7), ArmPose.Compute(arm, [0.7]).Flange.Rotation.R32, PoseTolerance);
    }

    [Theory]
    [InlineData("1.57", 1.57, "0.0456")]
    [InlineData("1.5708", 1.5708, "0.00021")]
    [InlineData("3.1416", 3.1416, "0.000421")]
    public void ToArm_OfRoundedRightAngles_KeepsThemAndSaysSo(string text, double angle, string degreesOff)
    {
        // Errors of rounded right angles: 1.57 is 0.04562616…°, 1.5708 0.00021045…°, 3.1416 0.00042091…° off (computed with numpy).
        var read = UrdfModel.Read(File($"""<origin rpy="{text} 0 0"/><axis xyz="0 0 1"/><limit lower="-1" upper="1" effort="1" velocity="1"/>"""));
        var arm = read.Value!.ToArm();
        var rotation = arm.Value!.ToArmModel().Joints[0].PoseInPrevious.Rotation;

        Assert.Equal(Math.Cos(angle), rotation.R33, PoseTolerance);
        Assert.Contains($"is {degreesOff}", Assert.Single(read.Remarks).Message, StringComparison.Ordinal);
        Assert.Equal(read.Remarks[0], arm.Remarks[0]);
    }

    [Theory]
    [InlineData("revolute", """<limit effort="1" velocity="1"/>""", "which means not given: joint positions")]
    [InlineData("revolute", """<limit lower="0" upper="0" effort="1" velocity="1"/>""", "which means not given: joint positions")]
    [InlineData("revolute", """<limit lower="-1" upper="1" effort="1" velocity="0"/>""", "which means not given: joint speed")]
    [InlineData("revolute", """<limit upper="1" effort="1" velocity="1"/>""", "the specification makes it 0")]
    [InlineData("continuous", "", "which means not given: joint speed")]
    [InlineData("continuous", """<limit velocity="1"/>""", null)]
    public void ToArm_WithMissingLimits_ImportsThemAsNotGiven(string type, string limit, string? remark)
    {
        // Absent bounds parse as 0/0 in version 1.0 of the specification and mean "not given".
        var read = UrdfModel.Read(File("""<axis xyz="0 0 1"/>""" + limit, type)).Value!.ToArm();
        var limits = read.Value!.Joints[0].Limits;

        Assert.Equal(remark is not null, read.Remarks.Any(r => r.Field == "joint j" && r.Message.Contains(remark ?? "not given", StringComparison.Ordinal)));
        Assert.Equal(remark?.Contains("positions", StringComparison.Ordinal) == true || type == "continuous", limits.Low is null);
        Assert.Equal(remark?.Contains("joint speed", StringComparison.Ordinal) == true, limits.Speed is null);
    }

    [Fact]
    public void MimicOf_AChainOfFollowers_MultipliesFactorsAndOffsetsOut()
    {
        const string Joint = """<joint name="{0}" type="continuous"><parent link="{1}"/><child link="{2}"/><axis xyz="0 0 1"/>{3}</joint>""";
        var file = "<robot name=\"r\"><link name=\"a\"/><link name=\"b\"/><link name=\"c\"/><link name=\"d\"/>"
            + string.Format(System.Globalization.CultureInfo.InvariantCulture, Joint, "j3", "c", "d", """<mimic joint="j2" multiplier="-0.5" offset="0.3"/>""")
            + string.Format(System.Globalization.CultureInfo.InvariantCulture, Joint, "j2", "b", "c", """<mimic joint="j1" multiplier="2" offset="0.1"/>""")
            + string.Format(System.Globalization.CultureInfo.InvariantCulture, Joint, "j1", "a", "b", "") + "</robot>";

        var model = UrdfModel.Read(file).Value!;

        // By hand: q2 = 2 · 0.4 + 0.1 = 0.9, q3 = -0.5 · 0.9 + 0.3 = -0.15, slope -1.
        var (second, third) = (model.MimicOf("j2")!, model.MimicOf("j3")!);
        Assert.Equal(0.9, second.Multiplier * 0.4 + second.Offset, 1e-12);
        Assert.Equal(-0.15, third.Multiplier * 0.4 + third.Offset, 1e-12);
        Assert.Equal(("j1", -1.0), (third.Follows, third.Multiplier));
        Assert.Null(model.MimicOf("j1"));
    }

    [Fact]
    public void ToArm_BetweenLinksThatDontCarryEachOther_IsRefused()
    {
        var model = UrdfModel.Read(QuirkyUrdf.Text).Value!;

        Assert.Equal("The base link does not carry the tip link.", Assert.Single(model.ToArm("wrist", "upper").Problems).Message);
        Assert.Contains("nearest is “turret”", Assert.Single(model.ToArm("turet").Problems).Expected, StringComparison.Ordinal);
        Assert.Equal("The chain has 0 moving joints.", Assert.Single(model.ToArm("world_plate", "base").Problems).Message);
    }

    internal static string File(string inner, string type = "revolute") =>
        $"""<robot name="r"><link name="a"/><link name="b"/><joint name="j" type="{type}"><parent link="a"/><child link="b"/>{inner}</joint></robot>""";

    private static ArmDocument OneJoint(string inner) => UrdfModel.Read(File(inner)).Value!.ToArm().Value!;

    private static void AssertRow(double[] expected, params double[] actual)
    {
        Assert.Equal(expected.Length, actual.Length);
        for (var i = 0; i < expected.Length; i++)
        {
            Assert.Equal(expected[i], actual[i], PoseTolerance);
        }
    }
}
