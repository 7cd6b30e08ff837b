using PathPortal.Engine.Arms;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;
using PathPortal.Engine.Postures;
using PathPortal.Engine.Tests.Published;

namespace PathPortal.Engine.Tests.Postures;

public sealed class PostureFinderTests
{
    // m and rad; the finder promises 1e-9, comparing two forward kinematics adds rounding only.
    private const double PoseTolerance = 1.1e-9;

    private static readonly RigidTransform BentTool = new(RotationMatrix.AboutY(Angle.FromDegrees(35)), new(0.03, 0, 0.12));

    private static readonly JointLimits OneTurn = TestArms.Limits(-Math.PI, Math.PI);

    [Fact]
    public void All_RegularPoseOfSphericalWristArm_GivesEightBranches()
    {
        // Two shoulders, two elbows, two wrists (Pieper 1968); limits of ±180° leave one turn of each.
        var arm = TestArms.SixJoints(OneTurn);
        double[] joints = [0.3, 1.0, 0.3, 0.4, -1.1, 0.5];
        var goal = ArmPose.Compute(arm, joints).Tool(BentTool);

        var finder = new PostureFinder(arm, BentTool);
        var found = finder.All(goal);

        Assert.True(finder.ClosedForm);
        Assert.Equal(8, found.Inside.Length);
        Assert.Equal(8, found.Inside.Select(p => p.Description).Distinct().Count());
        Assert.All(found.Inside, p => AssertPose(arm, BentTool, p.Joints.AsSpan(), goal));
        Assert.Contains(found.Inside, p => IsNear(arm, p.Joints.AsSpan(), joints, 1e-8));
    }

    [Fact]
    public void All_RandomSphericalWristArms_ReachThePoseAndContainTheOriginal() => Seeded.Cases(2000, random =>
    {
        var arm = TestArms.RandomSphericalWrist(random);
        var joints = TestArms.RandomJoints(random, arm);
        var X_FT = random.Pose(0.2);
        var goal = ArmPose.Compute(arm, joints).Tool(X_FT);

        var finder = new PostureFinder(arm, X_FT);
        var found = finder.All(goal);

        Assert.True(finder.ClosedForm);
        Assert.All(found.Inside, p => AssertPose(arm, X_FT, p.Joints.AsSpan(), goal));

        // Near a singular posture (σ_min small) the joints are known only to the pose tolerance divided by σ_min.
        var sigma = ScaledJacobian.Compute(arm, joints, X_FT).SingularValues[^1];
        var tolerance = 1e-8 + 1e-8 / sigma;
        Assert.True(sigma < 1e-4 || found.Inside.Any(p => IsNear(arm, p.Joints.AsSpan(), joints, tolerance)), $"original lost, σ_min {sigma}");
    });

    [Fact]
    public void All_SearchOnTheSameArm_FindsNoBranchTheClosedFormMisses() => Seeded.Cases(20, random =>
    {
        // The second route: Newton from spread starts on the same pose, the arm's wrist made 0.1 µm wrong so that the closed form is refused.
        var arm = TestArms.RandomSphericalWrist(random);
        var off = RigidTransform.FromTranslation(1e-7, 0, 0);
        var searched = arm with { Joints = arm.Joints.SetItem(4, arm.Joints[4] with { PoseInPrevious = arm.Joints[4].PoseInPrevious * off }) };
        var joints = TestArms.RandomJoints(random, arm);
        if (ScaledJacobian.Compute(arm, joints, BentTool).SingularValues[^1] < 1e-2)
        {
            return;
        }

        var goal = ArmPose.Compute(arm, joints).Tool(BentTool);
        var closed = new PostureFinder(arm, BentTool).All(goal);
        var search = new PostureFinder(searched, BentTool);
        var found = search.All(goal);

        Assert.False(search.ClosedForm);
        Assert.NotEmpty(found.Inside);
        var regular = found.Inside.Where(p => ScaledJacobian.Compute(arm, p.Joints.AsSpan(), BentTool).SingularValues[^1] > 1e-2);
        Assert.All(regular, p => Assert.Contains(closed.Inside, c => IsNear(arm, c.Joints.AsSpan(), p.Joints.AsSpan(), 1e-3)));
    });

    [Fact]
    public void All_RandomSixJointArms_ReachThePoseAndContainTheOriginal() => Seeded.Cases(60, random =>
    {
        var arm = TestArms.Random(random, 6);
        var joints = TestArms.RandomJoints(random, arm);
        var goal = ArmPose.Compute(arm, joints).Tool(BentTool);
        var found = new PostureFinder(arm, BentTool).All(goal);

        Assert.All(found.Inside, p => AssertPose(arm, BentTool, p.Joints.AsSpan(), goal));

        // A search may miss a branch in principle; over 600 such arms it missed none. Arms with four sliding joints are singular everywhere.
        var sigma = ScaledJacobian.Compute(arm, joints, BentTool).SingularValues[^1];
        Assert.True(sigma < 1e-6 || found.Inside.Any(p => IsNear(arm, p.Joints.AsSpan(), joints, 1e-5)), $"original lost, σ_min {sigma}");
    });

    [Fact]
    public void Continue_PublishedNewtonExample_ReachesTheTarget()
    {
        // Lynch and Park 2017, Example 6.1: planar arm of unit links from (0°, 30°) to the pose of (30°, 90°).
        var published = PublishedCase.Get("JAC-14");
        var arm = TestArms.Planar(published.Input("links"));
        double[] start = [.. published.Input("start_deg").Select(d => d * Math.PI / 180)];
        double[] target = [.. published.Input("target_deg").Select(d => d * Math.PI / 180)];
        var reached = new PostureFinder(arm, RigidTransform.Identity).Continue(ArmPose.Compute(arm, target).Flange, start);

        Approximately.Equal(target, reached!.Value, published.Tolerance, published.Source);
    }

    [Fact]
    public void All_WristStraight_KeepsThePoseAndOneWrist()
    {
        var arm = TestArms.SixJoints(OneTurn);
        double[] joints = [0.3, 1.0, 0.3, 0.7, 0, 0.5];
        var goal = ArmPose.Compute(arm, joints).Tool(BentTool);

        var found = new PostureFinder(arm, BentTool).All(goal);

        Assert.NotEmpty(found.Inside);
        Assert.All(found.Inside, p => AssertPose(arm, BentTool, p.Joints.AsSpan(), goal));
        Assert.Contains(found.Inside, p => p.Description.Contains("wrist straight", StringComparison.Ordinal));
    }

    [Fact]
    public void All_ArmStretched_FindsTheEdgeOfReach()
    {
        // Elbow stretched: joint 3 where the forearm, with its offset of 30 mm, lies in line with the upper arm.
        var arm = TestArms.SixJoints(OneTurn);
        double[] joints = [0.3, 0.8, Math.PI / 2 - Math.Atan2(0.03, 0.38), 0.7, 0.9, 0.5];
        var goal = ArmPose.Compute(arm, joints).Tool(BentTool);

        var found = new PostureFinder(arm, BentTool).All(goal);

        Assert.Contains(found.Inside, p => IsNear(arm, p.Joints.AsSpan(), joints, 1e-3));
        Assert.All(found.Inside, p => AssertPose(arm, BentTool, p.Joints.AsSpan(), goal));
        var further = goal with { Translation = goal.Translation + 0.001 * goal.Translation.Normalised() };
        Assert.DoesNotContain(new PostureFinder(arm, BentTool).All(further).Inside, p => IsNear(arm, p.Joints.AsSpan(), joints, 0.3));
    }

    [Fact]
    public void All_OutOfReach_GivesNothing()
    {
        var set = new PostureFinder(TestArms.SixJoints(), BentTool).All(RigidTransform.FromTranslation(5, 0, 0));

        Assert.Empty(set.Inside);
        Assert.Empty(set.Outside);
    }

    [Fact]
    public void All_LimitsOfTwoTurns_CountsWholeTurnsApart()
    {
        var arm = TestArms.SixJoints(OneTurn);
        var wide = arm with { Joints = arm.Joints.SetItem(5, arm.Joints[5] with { Limits = TestArms.Limits(-2 * Math.PI, 2 * Math.PI) }) };
        double[] joints = [0.3, 1.0, 0.3, 0.4, -1.1, 0.5];
        var goal = ArmPose.Compute(arm, joints).Tool(BentTool);

        var found = new PostureFinder(wide, BentTool).All(goal);

        Assert.Equal(16, found.Inside.Length);
        Assert.Contains(found.Inside, p => IsExactlyNear(p.Joints.AsSpan(), [0.3, 1.0, 0.3, 0.4, -1.1, 0.5 - 2 * Math.PI]));
        Assert.Contains(found.Inside, p => p.Description.EndsWith("joint 6 −1 turn", StringComparison.Ordinal));
    }

    [Fact]
    public void All_NarrowLimits_PutsTheRestOutside()
    {
        var arm = TestArms.SixJoints(OneTurn);
        var narrow = arm with { Joints = arm.Joints.SetItem(4, arm.Joints[4] with { Limits = TestArms.Limits(-1.2, -0.5) }) };
        double[] joints = [0.3, 1.0, 0.3, 0.4, -1.1, 0.5];
        var goal = ArmPose.Compute(arm, joints).Tool(BentTool);

        var found = new PostureFinder(narrow, BentTool).All(goal);

        Assert.Contains(found.Inside, p => IsNear(arm, p.Joints.AsSpan(), joints, 1e-8));
        Assert.All(found.Inside, p => Assert.InRange(p.Joints[4], -1.2, -0.5));
        Assert.Equal(8, found.Inside.Length + found.Outside.Length);
        Assert.NotEmpty(found.Outside);
    }

    [Fact]
    public void All_ArmOnTrack_ReachesThePoseFromSeveralPlaces()
    {
        var arm = TestArms.OnTrack();
        double[] joints = [1.4, 0.3, 1.0, 0.3, 0.4, -1.1, 0.5];
        var goal = ArmPose.Compute(arm, joints).Tool(BentTool);

        var found = new PostureFinder(arm, BentTool).All(goal);

        Assert.All(found.Inside, p => AssertPose(arm, BentTool, p.Joints.AsSpan(), goal));
        Assert.InRange(found.Inside.Select(p => p.Joints[0]).Distinct().Count(), 3, 17);
        Assert.Contains(found.Inside, p => p.Description.StartsWith("track at 1.500 m, shoulder front", StringComparison.Ordinal));
    }

    [Fact]
    public void All_FiveJointArmWithAxisTask_ReachesPointAndDirection() => Seeded.Cases(30, random =>
    {
        var six = TestArms.SixJoints(OneTurn);
        var arm = six with { Joints = six.Joints[..5], FlangeInLastJoint = six.Joints[5].PoseInPrevious * six.FlangeInLastJoint };
        double[] joints = [.. Enumerable.Range(0, 5).Select(_ => random.Between(-1.5, 1.5))];
        var goal = ArmPose.Compute(arm, joints).Tool(BentTool)
            * new RigidTransform(RotationMatrix.AboutZ(Angle.FromRadians(random.Between(-3, 3))), Vector3D.Zero);

        var found = new PostureFinder(arm, BentTool).All(goal, TaskKind.Axis);

        Assert.NotEmpty(found.Inside);
        Assert.All(found.Inside, p =>
        {
            var tool = ArmPose.Compute(arm, p.Joints.AsSpan()).Tool(BentTool);
            Assert.InRange((tool.Translation - goal.Translation).Norm, 0, PoseTolerance * 2);
            Assert.InRange(tool.Rotation.AxisZ.Cross(goal.Rotation.AxisZ).Norm, 0, PoseTolerance * 2);
            Assert.True(tool.Rotation.AxisZ.Dot(goal.Rotation.AxisZ) > 0);
        });
    });

    [Fact]
    public void Nearest_SmallMove_StaysOnTheBranch() => Seeded.Cases(300, random =>
    {
        var arm = TestArms.SixJoints();
        double[] seed = [random.Between(-3, 3), random.Between(0.4, 1.4), random.Between(-0.5, 0.8), random.Between(-4, 4), random.Between(0.3, 1.5), random.Between(-6, 6)];
        var target = seed.Select(q => q + random.Between(-0.02, 0.02)).ToArray();
        var nearest = new PostureFinder(arm, BentTool).Nearest(ArmPose.Compute(arm, target).Tool(BentTool), seed);

        Assert.NotNull(nearest);
        Assert.True(IsExactlyNear(nearest.Value.AsSpan(), target), "left the branch or the turn of a joint");
    });

    [Fact]
    public void Nearest_BranchBeyondALimit_TakesAnother()
    {
        var arm = TestArms.SixJoints(OneTurn);
        double[] joints = [0.3, 1.0, 0.3, 0.4, -1.1, 0.5];
        var narrow = arm with { Joints = arm.Joints.SetItem(4, arm.Joints[4] with { Limits = TestArms.Limits(0, 2) }) };
        var goal = ArmPose.Compute(arm, joints).Tool(BentTool);

        var nearest = new PostureFinder(narrow, BentTool).Nearest(goal, joints);

        Assert.NotNull(nearest);
        Assert.InRange(nearest.Value[4], 0, 2);
        AssertPose(arm, BentTool, nearest.Value.AsSpan(), goal);
    }

    [Fact]
    public void Nearest_OutOfReach_IsNull() =>
        Assert.Null(new PostureFinder(TestArms.SixJoints(), BentTool).Nearest(RigidTransform.FromTranslation(5, 0, 0), new double[6]));

    [Fact]
    public void Continue_GoalThatIsNotFinite_IsNull() => Assert.Null(
        new PostureFinder(TestArms.SixJoints(), BentTool).Continue(RigidTransform.FromTranslation(double.NaN, 0, 0), new double[6]));

    [Fact]
    public void All_Twice_GivesTheSameBits()
    {
        var arm = TestArms.Random(new Random(5), 6);
        var goal = ArmPose.Compute(arm, TestArms.RandomJoints(new Random(6), arm)).Tool(BentTool);
        double[] Bits() => [.. new PostureFinder(arm, BentTool).All(goal).Inside.SelectMany(p => p.Joints)];

        Assert.Equal(Bits(), Bits());
    }

    private static bool IsNear(ArmModel arm, ReadOnlySpan<double> a, ReadOnlySpan<double> b, double tolerance)
    {
        for (var i = 0; i < a.Length; i++)
        {
            var difference = a[i] - b[i];
            difference = arm.Joints[i].Kind == JointKind.Revolute ? Math.IEEERemainder(difference, 2 * Math.PI) : difference;
            if (!(Math.Abs(difference) < tolerance))
            {
                return false;
            }
        }

        return true;
    }

    // 1e-7 rad: the pose tolerance of 1e-9 divided by σ_min of the postures used here.
    private static bool IsExactlyNear(ReadOnlySpan<double> a, ReadOnlySpan<double> b)
    {
        for (var i = 0; i < a.Length; i++)
        {
            if (!(Math.Abs(a[i] - b[i]) < 1e-7))
            {
                return false;
            }
        }

        return true;
    }

    private static void AssertPose(ArmModel arm, RigidTransform tool, ReadOnlySpan<double> joints, RigidTransform goal)
    {
        var reached = ArmPose.Compute(arm, joints).Tool(tool);
        Assert.InRange((reached.Translation - goal.Translation).Norm, 0, PoseTolerance * 2);
        Assert.InRange(RotationVector.Of(reached.Rotation.Transposed() * goal.Rotation).Norm, 0, PoseTolerance * 2);
    }
}
