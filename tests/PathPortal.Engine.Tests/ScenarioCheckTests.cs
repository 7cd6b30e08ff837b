using PathPortal.Engine.Arms;
using PathPortal.Engine.Control;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;
using PathPortal.Engine.Verdicts;

namespace PathPortal.Engine.Tests;

public sealed class ScenarioCheckTests
{
    private static readonly Scenario Good = TestScenario.Complete;

    [Fact]
    public void Find_CompleteScenario_HasNoProblem() => Assert.Empty(ScenarioCheck.Find(Good));

    private static readonly Dictionary<string, Scenario> Bad = new()
    {
        { "controller, period: 0 s, must be above zero", Good with { Controller = Good.Controller with { Period = 0 } } },
        { "controller, period: NaN s, must be above zero", Good with { Controller = Good.Controller with { Period = double.NaN } } },
        { "controller, position gain: -1 1/s, must be zero or more", Good with { Controller = Good.Controller with { PositionGain = -1 } } },
        { "controller, measurement delay: 65, must be between 0 and 64", Good with { Controller = Good.Controller with { MeasurementDelay = 65 } } },
        { "controller, damping ε: 0, must be above zero", Good with { Controller = Good.Controller with { Damping = Damping.Variable(0.1, 0) } } },
        { "controller, time law: 99, is not a known choice", Good with { Controller = Good.Controller with { TimeLaw = (TimeLaw)99 } } },
        { "arm, number of joints: 0, must be 1 to 8", Good with { Arm = Good.Arm with { Joints = [] } } },
        { "arm, characteristic length: -1 m, must be above zero", Good with { Arm = Good.Arm with { CharacteristicLength = -1 } } },
        { "joint 3, sign: 0, must be 1 or -1", WithJoint(2, j => j with { Sign = 0 }) },
        { "joint 2, zero: Infinity rad, must be between -1000 and 1000", WithJoint(1, j => j with { Zero = double.PositiveInfinity }) },
        { "joint 1, high position limit: -3 rad, must be above the low limit, -2 rad", WithLimits(0, l => l with { High = new(-3, "") }) },
        { "joint 4, speed limit: 0 rad/s, must be above zero", WithLimits(3, l => l with { Speed = new(0, "") }) },
        { "joint 5, position limit: -2 rad, a continuous joint has no position limit", WithLimits(4, l => l with { Continuous = true }) },
        { "joint 1, required clearance: 2 rad, must leave room in the joint's range of 4 rad", Good with { Criteria = Good.Criteria with { RevoluteClearance = 2 } } },
        { "criteria, across tolerance: 0 m, must be above zero", Good with { Criteria = Good.Criteria with { AcrossTolerance = 0 } } },
        { "criteria, speed share: 1.5, must be above 0 and at most 1", Good with { Criteria = Good.Criteria with { SpeedShare = 1.5 } } },
        { "start, number of joint values: 2, must be the number of joints, 6", Good with { Start = [1, 2] } },
        { "start, joint 2: NaN rad or m, must be a finite number", Good with { Start = [0, double.NaN, 0, 0, 0, 0] } },
        { "path, number of waypoints: 1, must be 2 to 200000", Good with { Path = new([Good.Path.Waypoints[0]]) } },
        { "waypoint 3, position: NaN m, must be three finite numbers", WithWaypoint(2, w => w with { Position = new(0, double.NaN, 0) }) },
        { "waypoint 3, orientation: 0, must be a quaternion of norm 1; this is its norm", WithWaypoint(2, w => w with { Orientation = default }) },
        { "waypoint 4, speed: 0 m/s, must be above zero", WithWaypoint(3, w => w with { Speed = 0 }) },
        { "waypoint 2, joint speed share: 0, must be above 0 and at most 1", WithWaypoint(1, w => w with { JointSpeedShare = 0 }) },
        { "waypoint 3, dwell: 1 s, must be zero where the corner is rounded: the tool does not stop there", WithWaypoint(2, w => w with { Dwell = 1 }) },
        { "controller, period: 2 s, must be at most 1 s", Good with { Controller = Good.Controller with { Period = 2 } } },
        { "joint 1, high position limit: 1E+300 rad, must be between -1000 and 1000", WithLimits(0, l => l with { High = new(1e300, "") }) },
        { "start, free turn: 90 rad, must be between -6.28319 and 6.28319", Good with { FreeTurn = 90 } },
        {
            "cell, base pose, distance: 1500 m, must be at most 1000 m",
            Good with { Cell = Good.Cell with { BaseInCell = RigidTransform.FromTranslation(1500, 0, 0) } }
        },
        { "cell, tool, rotation: 1, must be a rotation; this is how far the matrix is from one", Good with { Cell = Good.Cell with { ToolInFlange = default } } },
    };

    public static TheoryData<string> Expectations => [.. Bad.Keys];

    [Theory]
    [MemberData(nameof(Expectations))]
    public void Find_BadInput_NamesPlaceValueAndExpectation(string expected) =>
        Assert.Contains(expected, ScenarioCheck.Find(Bad[expected]).Select(p => p.ToString()));

    [Fact]
    public void Find_MoreRowsThanJoints_IsRefused()
    {
        var arm = Good.Arm with { Joints = Good.Arm.Joints[..5] };
        var scenario = Good with { Arm = arm, Start = null, Path = new([Good.Path.Waypoints[0], Good.Path.Waypoints[3]]) };

        Assert.Contains(
            "waypoint 2, constrained directions: 6, must be at most the number of joints, 5", ScenarioCheck.Find(scenario).Select(p => p.ToString()));
    }

    [Fact]
    public void Find_EndlessRun_IsRefusedBeforeAnythingIsAllocated()
    {
        var scenario = WithWaypoint(3, w => w with { Speed = 1e-9 });

        Assert.Contains(ScenarioCheck.Find(scenario), p => p is { Place: "path", Quantity: "least number of samples" });
    }

    [Fact]
    public void Find_ManyProblems_StopsAtFifty()
    {
        var bad = Good.Path.Waypoints[3] with { Speed = double.NaN };
        var scenario = Good with { Path = new([.. Enumerable.Repeat(bad, 5000)]) };

        Assert.Equal(50, ScenarioCheck.Find(scenario).Length);
    }

    [Fact]
    public void Find_StartOutsideLimits_IsLeftToTheRun() => Assert.Empty(ScenarioCheck.Find(Good with { Start = [9, 0, 0, 0, 0, 0] }));

    private static Scenario WithJoint(int index, Func<Joint, Joint> change) =>
        Good with { Arm = Good.Arm with { Joints = Good.Arm.Joints.SetItem(index, change(Good.Arm.Joints[index])) } };

    private static Scenario WithLimits(int index, Func<JointLimits, JointLimits> change) =>
        WithJoint(index, j => j with { Limits = change(j.Limits) });

    private static Scenario WithWaypoint(int index, Func<Waypoint, Waypoint> change) =>
        Good with { Path = new(Good.Path.Waypoints.SetItem(index, change(Good.Path.Waypoints[index]))) };
}
