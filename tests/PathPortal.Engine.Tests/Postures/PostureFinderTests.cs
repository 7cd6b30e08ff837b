using PathPortal.Engine.Arms;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;
using PathPortal.Engine.Postures;

namespace PathPortal.Engine.Tests.Postures;

public sealed class PostureFinderTests
{
    // m and rad; the finder promises 1e-9, comparing two forward kinematics adds rounding only.
    private const double PoseTolerance = 1.1e-9;

    private static readonly RigidTransform BentTool = new(RotationMatrix.AboutY(Angle.FromDegrees(35)), new(0.03, 0, 0.12));

    [Fact]
    public void All_RegularPoseOfSphericalWristArm_GivesEightBranches()
    {
        // Two shoulders, two elbows, two wrists (Pieper 1968); limits of ±180° leave one turn of each.
        var arm = TestArms.SixJoints(TestArms.Limits(-Math.PI, Math.PI));
        double[] joints = [0.3, 1.0, 0.3, 0.4, -1.1, 0.5];
        var goal = ArmPose.Compute(arm, joints).Tool(BentTool);

        var finder = new PostureFinder(arm, BentTool);
        var found = finder.All(goal);

        Assert.True(finder.ClosedForm);
        Assert.Equal(8, found.Inside.Length);
        Assert.Equal(8, found.Inside.Select(p => p.Description).Distinct().Count());
        Assert.All(found.Inside, p => AssertPose(arm, BentTool, p.Joints.AsSpan(), goal));
        Assert.Contains(found.Inside, p => p.Joints.Zip(joints).All(z => Math.Abs(z.First - z.Second) < 1e-8));
    }

    private static void AssertPose(ArmModel arm, RigidTransform tool, ReadOnlySpan<double> joints, RigidTransform goal)
    {
        var reached = ArmPose.Compute(arm, joints).Tool(tool);
        Assert.InRange((reached.Translation - goal.Translation).Norm, 0, PoseTolerance);
        Assert.InRange(RotationVector.Of(reached.Rotation.Transposed() * goal.Rotation).Norm, 0, PoseTolerance);
    }
}
