using PathPortal.Engine.Arms;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;
using PathPortal.Engine.Postures;

namespace PathPortal.Engine.Tests.Postures;

/// <summary>Arms nobody would build: whatever comes out must reach the pose or be nothing, and nothing may throw.</summary>
public sealed class DegenerateArmTests
{
    public static TheoryData<string> Arms => [.. Degenerate.Keys];

    private static readonly Dictionary<string, ArmModel> Degenerate = new()
    {
        ["six equal axes through one point"] = new StandardDhTable(Rows(0, 0, 6), RigidTransform.Identity).ToArm("d", 1),
        ["six parallel axes"] = new StandardDhTable(Rows(0.3, 0, 6), RigidTransform.Identity).ToArm("d", 1),
        ["six axes through one point"] = new StandardDhTable(Rows(0, 90, 6), RigidTransform.Identity).ToArm("d", 1),
        ["one joint"] = new StandardDhTable(Rows(0.3, 90, 1), RigidTransform.Identity).ToArm("d", 1),
        ["eight joints"] = new StandardDhTable(Rows(0.2, 90, 8), RigidTransform.Identity).ToArm("d", 1),
        ["no forearm"] = NoForearm(),
    };

    [Theory]
    [MemberData(nameof(Arms))]
    public void All_DegenerateArm_GivesReachingPosturesOrNone(string name)
    {
        var arm = Degenerate[name];
        foreach (var task in Enum.GetValues<TaskKind>())
        {
            var goal = ArmPose.Compute(arm, [.. arm.Joints.Select((_, i) => 0.2 * i - 0.3)]).Tool(RigidTransform.FromTranslation(0.01, 0, 0.1));
            var finder = new PostureFinder(arm, RigidTransform.FromTranslation(0.01, 0, 0.1));
            var found = finder.All(goal, task);

            Assert.All(found.Inside.Concat(found.Outside), p =>
            {
                var tool = ArmPose.Compute(arm, p.Joints.AsSpan()).Tool(RigidTransform.FromTranslation(0.01, 0, 0.1));
                Assert.InRange((tool.Translation - goal.Translation).Norm, 0, 2e-9);
                Assert.NotEqual("", p.Description);
            });
            Assert.Empty(finder.All(RigidTransform.FromTranslation(double.NaN, 0, 0), task).Inside);
            Assert.Null(finder.Nearest(RigidTransform.FromTranslation(double.PositiveInfinity, 0, 0), new double[arm.Joints.Length], task));
        }
    }

    private static System.Collections.Immutable.ImmutableArray<DhRow> Rows(double a, double alphaDegrees, int count) =>
        [.. Enumerable.Range(1, count).Select(i => new DhRow(
            $"j{i}", JointKind.Revolute, a, Angle.FromDegrees(alphaDegrees), 0, Angle.Zero, 1, 0, TestArms.Limits(-3, 3)))];

    private static ArmModel NoForearm()
    {
        var arm = TestArms.SixJoints();
        return arm with { Joints = arm.Joints.SetItem(2, arm.Joints[2] with { PoseInPrevious = RigidTransform.Identity }) };
    }
}
