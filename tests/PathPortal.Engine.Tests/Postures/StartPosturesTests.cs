using PathPortal.Engine.Arms;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;
using PathPortal.Engine.Postures;

namespace PathPortal.Engine.Tests.Postures;

public sealed class StartPosturesTests
{
    private static readonly double[] Joints = [0.3, 1.0, 0.3, 0.4, -1.1, 0.5];

    [Fact]
    public void Find_StartGiven_IsThatStartAlone()
    {
        var found = StartPostures.Find(TestScenario.Complete);

        var start = Assert.Single(found.Starts);
        Assert.Equal(TestScenario.Complete.Start!.Value, start.Joints);
        Assert.Equal(0.25, start.FreeTurn);
    }

    [Fact]
    public void Find_PoseTask_GivesEveryPostureOfTheFirstWaypoint()
    {
        var scenario = Scenario(TaskKind.Pose, 2);
        var found = StartPostures.Find(scenario);

        Assert.Null(found.Reason);
        Assert.NotEmpty(found.Starts);
        Assert.All(found.Starts, s => AssertPose(scenario, s));
        Assert.Contains(found.Starts, s => s.Joints.Zip(Joints).All(z => Math.Abs(z.First - z.Second) < 1e-7));
    }

    [Fact]
    public void Find_AxisTask_TriesTheTurnInStepsOf15Degrees()
    {
        var scenario = Scenario(TaskKind.Axis, 2);
        var found = StartPostures.Find(scenario);

        Assert.All(found.Starts, s => AssertPose(scenario, s));
        Assert.InRange(found.Starts.Select(s => s.FreeTurn).Distinct().Count(), 2, 24);
        Assert.All(found.Starts, s => Approximately.Equal(0, Math.IEEERemainder(s.FreeTurn, Math.PI / 12), 1e-15, "step"));
        Assert.InRange(found.Starts.Length, 9, StartPostures.Most);
    }

    [Fact]
    public void Find_AxisTaskWithTurnGiven_TriesThatTurnOnly()
    {
        var scenario = Scenario(TaskKind.Axis, 2) with { FreeTurn = 0.7 };
        var found = StartPostures.Find(scenario);

        Assert.All(found.Starts, s => Assert.Equal(0.7, s.FreeTurn));
        Assert.All(found.Starts, s => AssertPose(scenario, s));
    }

    [Fact]
    public void Find_OutOfReach_SaysSo()
    {
        var scenario = Scenario(TaskKind.Pose, 2);
        var far = scenario with { Cell = scenario.Cell with { WorkInCell = RigidTransform.FromTranslation(4, 0, 0) } };
        var found = StartPostures.Find(far);

        Assert.Empty(found.Starts);
        Assert.Equal("The first waypoint is out of the arm's reach.", found.Reason);
    }

    [Fact]
    public void Find_OnlyBeyondLimits_NamesJointValueAndLimit()
    {
        var found = StartPostures.Find(Scenario(TaskKind.Pose, 0.2));

        Assert.Empty(found.Starts);
        Assert.StartsWith("The first waypoint can be reached only beyond joint limits: joint ", found.Reason, StringComparison.Ordinal);
        Assert.Contains("limit ", found.Reason, StringComparison.Ordinal);
    }

    [Fact]
    public void Find_ManyTurns_KeepsThoseWithMostRoom()
    {
        var found = StartPostures.Find(Scenario(TaskKind.Axis, 3.5 * Math.PI));

        Assert.Equal(StartPostures.Most, found.Starts.Length);
        Assert.True(found.LeftOut > 0);
    }

    // The first waypoint is where the arm is with the joints above; limits are the same for all joints.
    private static Scenario Scenario(TaskKind task, double limit)
    {
        var arm = TestArms.SixJoints(TestArms.Limits(-limit, limit));
        var scenario = TestScenario.Complete with { Arm = arm, Start = null, FreeTurn = null };
        var X_WT = scenario.Cell.WorkInCell.Inverse() * scenario.Cell.BaseInCell * ArmPose.Compute(arm, Joints).Tool(scenario.Cell.ToolInFlange);
        var first = TestScenario.Complete.Path.Waypoints[0] with
        {
            Position = X_WT.Translation,
            Orientation = UnitQuaternion.FromMatrix(X_WT.Rotation),
        };
        var second = first with { Motion = MotionKind.Straight, Task = task, Position = first.Position + 0.1 * Vector3D.UnitZ };
        return scenario with { Path = new([first, second]) };
    }

    private static void AssertPose(Scenario scenario, StartPosture start)
    {
        var X_WT = scenario.Cell.WorkInCell.Inverse() * scenario.Cell.BaseInCell
            * ArmPose.Compute(scenario.Arm, start.Joints.AsSpan()).Tool(scenario.Cell.ToolInFlange);
        var goal = RotationMatrix.FromQuaternion(scenario.Path.Waypoints[0].Orientation) * RotationMatrix.AboutZ(Angle.FromRadians(start.FreeTurn));

        // m and rad: 1e-9 of the finder, with room for a quaternion made from a matrix.
        Approximately.Equal(scenario.Path.Waypoints[0].Position, X_WT.Translation, 2e-9, start.Description);
        Approximately.Equal(goal, X_WT.Rotation, 2e-9, start.Description);
    }
}
