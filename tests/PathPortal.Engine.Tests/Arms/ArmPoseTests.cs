using PathPortal.Engine.Arms;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Tests.Published;

namespace PathPortal.Engine.Tests.Arms;

public sealed class ArmPoseTests
{
    [Theory]
    [InlineData("FK-01")]
    [InlineData("FK-02")]
    [InlineData("FK-03")]
    [InlineData("FK-04")]
    [InlineData("FK-05")]
    [InlineData("FK-06")]
    [InlineData("FK-08")]
    [InlineData("FK-13")]
    public void Compute_PublishedArm_ReachesPublishedPose(string id)
    {
        var published = PublishedCase.Get(id);
        var flange = ArmPose.Compute(PublishedArm.Of(published), published.Input("q")).Flange;

        Approximately.Equal(published.ExpectedPose("T"), flange, published.Tolerance, published.Source);
    }

    [Fact]
    public void Compute_ModifiedTable_EndsAtTheLastJoint()
    {
        var published = PublishedCase.Get("FK-07");
        var flange = ArmPose.Compute(PublishedArm.Of(published), published.Input("q")).Flange;

        Approximately.Equal(published.ExpectedPose("T_frame3"), flange, published.Tolerance, published.Source);
        Approximately.Equal(
            published.ExpectedPose("T_with_tool"),
            flange * RigidTransform.FromTranslation(published.InputNumber("tool_x"), 0, 0),
            published.Tolerance,
            published.Source);
    }

    [Theory]
    [InlineData("mdh")]
    [InlineData("dh")]
    public void Compute_OneArmInBothTables_ReachesTheSamePose(string table)
    {
        var published = PublishedCase.Get("FK-09");
        var arm = PublishedArm.Read(published.Inputs.GetProperty(table));

        Approximately.Equal(
            published.ExpectedPose("T"), ArmPose.Compute(arm, published.Input("q")).Flange, published.Tolerance, published.Source);
    }

    [Fact]
    public void Compute_OneRowInBothTables_Differs()
    {
        var published = PublishedCase.Get("FK-10");
        var row = new DhRow(
            "j1",
            JointKind.Revolute,
            published.InputNumber("a"),
            Angle.FromRadians(published.InputNumber("alpha")),
            published.InputNumber("d"),
            Angle.Zero,
            1,
            0,
            new());
        double[] q = [published.InputNumber("theta")];

        Approximately.Equal(
            published.ExpectedPose("T_DH"),
            ArmPose.Compute(new StandardDhTable([row], RigidTransform.Identity).ToArm("one", 1), q).Flange,
            published.Tolerance,
            published.Source);
        Approximately.Equal(
            published.ExpectedPose("T_MDH"),
            ArmPose.Compute(new ModifiedDhTable([row], RigidTransform.Identity).ToArm("one", 1), q).Flange,
            published.Tolerance,
            published.Source);
    }

    [Fact]
    public void Compute_ScrewAxisExample_ReachesThePublishedPose()
    {
        var published = PublishedCase.Get("FK-11");
        var arm = PublishedArm.FromScrews(published.Inputs.GetProperty("S_space_omega_v"), published.Inputs.GetProperty("M"));

        Approximately.Equal(
            published.ExpectedPose("T"), ArmPose.Compute(arm, published.Input("q")).Flange, published.Tolerance, published.Source);
        Approximately.Equal(
            published.ExpectedPose("T_q2"), ArmPose.Compute(arm, published.Input("q2")).Flange, published.Tolerance, published.Source);
    }

    [Fact]
    public void Compute_SignZeroBaseAndTool_AllCount()
    {
        var published = PublishedCase.Get("FK-14");
        var arm = PublishedArm.Of(published);
        var X_CB = PublishedCase.Pose(published.Inputs.GetProperty("arm").GetProperty("base"));
        var X_FT = PublishedCase.Pose(published.Inputs.GetProperty("arm").GetProperty("tool"));
        var q = published.Input("q");

        Approximately.Equal(
            published.ExpectedPose("T"), X_CB * ArmPose.Compute(arm, q).Tool(X_FT), published.Tolerance, published.Source);

        // The published Jacobian is in axes of the cell; ours in axes of the base.
        var J = GeometricJacobian.Compute(arm, q, X_FT);
        var expected = published.ExpectedMatrix("J");
        for (var i = 0; i < q.Length; i++)
        {
            var column = new Twist(new(J[0, i], J[1, i], J[2, i]), new(J[3, i], J[4, i], J[5, i])).InAxesOf(X_CB.Rotation);
            Approximately.Equal(new Vector3D(expected[0][i], expected[1][i], expected[2][i]), column.Linear, published.Tolerance, published.Source);
            Approximately.Equal(new Vector3D(expected[3][i], expected[4][i], expected[5][i]), column.Angular, published.Tolerance, published.Source);
        }
    }

    [Fact]
    public void Compute_TableWrittenAsUrdfOrigins_ReachesTheSamePose()
    {
        var published = PublishedCase.Get("FK-15");
        var origins = published.Inputs.GetProperty("urdf_origins").EnumerateArray().Select(o =>
            new RigidTransform(PublishedArm.Rpy(o.GetProperty("rpy")), PublishedArm.Vector(o.GetProperty("xyz")))).ToArray();
        var q = published.Input("q");
        var links = origins.Take(q.Length).Select((origin, i) =>
            ChainLink.AboutAxis($"j{i + 1}", JointKind.Revolute, origin, Vector3D.UnitZ, 1, 0, new())).ToArray();
        var rest = origins.Skip(q.Length).Aggregate(RigidTransform.Identity, (product, origin) => product * origin);
        var arm = ChainLink.ToArm("urdf", links, rest, 1);

        Approximately.Equal(published.ExpectedPose("T"), ArmPose.Compute(arm, q).Flange, published.Tolerance, published.Source);
    }

    [Fact]
    public void AboutAxis_NonUnitObliqueAxis_TurnsInTheJointFrame()
    {
        var published = PublishedCase.Get("URDF-02");
        var origin = new RigidTransform(
            PublishedArm.Rpy(published.Inputs.GetProperty("rpy")), PublishedArm.Vector(published.Inputs.GetProperty("xyz")));
        var axis = PublishedArm.Vector(published.Inputs.GetProperty("axis"));
        var arm = ChainLink.ToArm(
            "one", [ChainLink.AboutAxis("j1", JointKind.Revolute, origin, axis, 1, 0, new())], RigidTransform.Identity, 1);

        Approximately.Equal(
            published.ExpectedPose("T"), ArmPose.Compute(arm, [published.InputNumber("q")]).Flange, published.Tolerance, published.Source);
    }

    [Fact]
    public void Compute_WrongNumberOfValues_SaysHowMany()
    {
        var failure = Assert.Throws<ArgumentException>(() => ArmPose.Compute(TestArms.SixJoints(), [0, 0, 0]));

        Assert.Contains("6 joints, but 3 values", failure.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Compute_RandomArms_KeepsAxesOnJoints() => Seeded.Cases(300, random =>
    {
        // A joint's own motion leaves its axis and the point on it where they are.
        var arm = TestArms.Random(random, random.Next(1, 9));
        var q = TestArms.RandomJoints(random, arm);
        var before = ArmPose.Compute(arm, q);
        for (var i = 0; i < q.Length; i++)
        {
            q[i] += 0.3;
            var after = ArmPose.Compute(arm, q).JointFrames[i];
            Approximately.Equal(before.JointFrames[i].Rotation.AxisZ, after.Rotation.AxisZ, 1e-14, $"axis {i}");
            var moved = after.Translation - before.JointFrames[i].Translation;
            Approximately.Equal(0, moved.Cross(after.Rotation.AxisZ).Norm, 1e-13, $"point on axis {i}");
            q[i] -= 0.3;
        }
    });
}
