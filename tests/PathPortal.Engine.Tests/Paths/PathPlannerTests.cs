using System.Collections.Immutable;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Control;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;
using PathPortal.Engine.Tests.Control;
using PathPortal.Engine.Tests.Published;

namespace PathPortal.Engine.Tests.Paths;

public sealed class PathPlannerTests
{
    // Rounding of a sum of a few lengths or times of order one.
    private const double Rounding = 1e-12;

    private static readonly ControllerSettings Controller =
        LoopScenarios.Controller with { TimeLaw = TimeLaw.Trapezoidal, ToolAcceleration = 2, ToolTurnSpeed = 1, ToolTurnAcceleration = 5 };

    [Fact]
    public void Plan_SquareUnderCubicLaw_TakesTwentySeconds()
    {
        var published = PublishedCase.Get("TRJ-15");
        var plan = Plan(
            LoopScenarios.Controller, At(0, 0), At(0.1, 0), At(0.1, 0.1), At(0, 0.1), At(0, 0));
        Approximately.Equal(published.ExpectedNumber("T_total"), Duration(plan), Rounding * 20, published.Source);
        Approximately.Equal(published.ExpectedNumber("length"), plan.Length, Rounding, published.Source);
    }

    [Fact]
    public void Plan_RoundedCorners_MissTheCornerAsPublished()
    {
        var published = PublishedCase.Get("TRJ-14");
        var d = published.InputNumber("d");
        foreach (var row in PublishedCase.Matrix(published.Expected.GetProperty("rows")))
        {
            var interior = row[0] * Math.PI / 180;
            var corner = new Vector3D(0.1, 0, 0);
            var end = corner + 0.1 * new Vector3D(-Math.Cos(interior), Math.Sin(interior), 0);
            var plan = Plan(Controller, At(0, 0), At(0.1, 0) with { CornerReach = d }, At(end.X, end.Y));
            var nearest = Sample(plan, 40_000).Min(s => (s.Place.Position - corner).Norm);

            // 40,000 samples over some seconds find the nearest point to a square of a tenth of a millimetre's hundredth.
            Approximately.Equal(row[1], nearest, 1e-8, $"{published.Source} interior angle {row[0]}°");
        }
    }

    [Theory]
    [InlineData(TimeLaw.Trapezoidal)]
    [InlineData(TimeLaw.Cubic)]
    [InlineData(TimeLaw.Quintic)]
    public void Plan_SpeedsAndCorners_KeepEveryBound(TimeLaw law)
    {
        var waypoints = new[]
        {
            At(0, 0), At(0.1, 0) with { Speed = 0.3, CornerReach = 0.01 }, At(0.1, 0.1) with { Speed = 0.1, CornerReach = 0.02 },
            At(0.2, 0.1) with { Speed = 0.5, CornerReach = 0.03, Orientation = RotationVector.ToQuaternion(new(0, 0, 0.4)) },
            At(0.3, 0.3) with { Speed = 0.4 },
        };
        var controller = Controller with { TimeLaw = law };
        var plan = Plan(controller, waypoints);
        var (step, last) = (Duration(plan) / 50_000, (ReferenceState?)null);
        foreach (var state in Sample(plan, 50_000))
        {
            var speed = state.Velocity.Norm;
            Assert.True(speed <= waypoints[state.Place.Waypoint].Speed * (1 + 1e-9), $"{speed} m/s before waypoint {state.Place.Waypoint}");
            Assert.True(state.TurnVelocity.Norm <= controller.ToolTurnSpeed * (1 + 1e-9), $"{state.TurnVelocity.Norm} rad/s");
            if (last is { } before)
            {
                // The derivative of position is the velocity: central differences, off by a third of a jerk times step².
                var mean = 0.5 * (state.Velocity + before.Velocity);
                Approximately.Equal((1 / step) * (state.Place.Position - before.Place.Position), mean, 2e-4, "velocity (m/s)");
                var turned = RotationVector.Of(state.Place.Orientation * before.Place.Orientation.Conjugate());
                Approximately.Equal((1 / step) * turned, 0.5 * (state.TurnVelocity + before.TurnVelocity), 5e-3, "turn (rad/s)");

                // Along and across the path each within the tool acceleration, so together within √2 of it.
                var acceleration = (1 / step) * (state.Velocity - before.Velocity);
                Assert.True(acceleration.Norm <= Math.Sqrt(2) * controller.ToolAcceleration * 1.01, $"{acceleration.Norm} m/s²");
            }

            last = state;
        }
    }

    [Fact]
    public void Plan_TrapezoidalLaw_ReachesEachProgrammedSpeed()
    {
        var plan = Plan(
            Controller,
            At(0, 0),
            At(0.3, 0) with { Speed = 0.3, CornerReach = 0.001 },
            At(0.6, 0) with { Speed = 0.1, CornerReach = 0.001 },
            At(0.9, 0) with { Speed = 0.4 });
        foreach (var (waypoint, speed) in new[] { (1, 0.3), (2, 0.1), (3, 0.4) })
        {
            var fastest = Sample(plan, 20_000).Where(s => s.Place.Waypoint == waypoint).Max(s => s.Velocity.Norm);
            Approximately.Equal(speed, fastest, 1e-9, $"fastest before waypoint {waypoint} (m/s)");
        }
    }

    [Fact]
    public void Plan_TurnOnTheSpot_TakesTheTurnsTime()
    {
        // 1 rad at 1 rad/s with 5 rad/s²: T = D/V + V/A (TRJ-05's law with angles).
        var plan = Plan(Controller, At(0, 0), At(0, 0) with { Orientation = RotationVector.ToQuaternion(new(0, 1, 0)) });
        Approximately.Equal(1 + 0.2, Duration(plan), 1e-9, "duration (s)");
        Assert.All(Sample(plan, 100), s => Assert.Equal(Vector3D.Zero, s.Place.Position));
    }

    [Fact]
    public void Plan_LongTurnOnShortWay_IsSlowedToTheTurn()
    {
        var plan = Plan(Controller, At(0, 0), At(0.001, 0) with { Speed = 0.5, Orientation = RotationVector.ToQuaternion(new(2, 0, 0)) });
        Assert.True(Duration(plan) >= 2 / Controller.ToolTurnSpeed);
        Assert.All(Sample(plan, 1000), s => Assert.True(s.TurnVelocity.Norm <= Controller.ToolTurnSpeed * (1 + 1e-9)));
    }

    [Fact]
    public void Plan_OverlappingRoundings_AreRefusedByWaypointAndLine()
    {
        var plan = Plan(
            Controller,
            At(0, 0),
            At(0.02, 0) with { CornerReach = 0.015, SourceLine = 3 },
            At(0.02, 0.02) with { CornerReach = 0.015, SourceLine = 4 },
            At(0.1, 0.02));
        Assert.Empty(plan.Moves);
        Assert.Contains(plan.Problems, p => p.Waypoint == 1 && p.SourceLine == 3 && p.Quantity == "corner reach" && p.Value == 0.015);
        Assert.Contains("waypoint 2 (line 3), corner reach: 0.015 m, must be at most 0.005 m", plan.Problems[0].ToString(), StringComparison.Ordinal);
    }

    [Fact]
    public void Plan_RoundedReversal_IsRefused()
    {
        var plan = Plan(Controller, At(0, 0), At(0.1, 0) with { CornerReach = 0.01 }, At(0, 0.001));
        Assert.Contains(plan.Problems, p => p.Quantity == "change of direction" && p.Value > 170);
    }

    [Fact]
    public void Plan_EqualPoints_AreRemarkedAndPassedOver()
    {
        var plan = Plan(Controller, At(0, 0), At(0.1, 0), At(0.1, 0) with { SourceLine = 7 }, At(0.2, 0));
        Assert.Empty(plan.Problems);
        Assert.Equal(2, plan.Moves.Length);
        Assert.Contains("Waypoint 3 (line 7)", Assert.Single(plan.Remarks), StringComparison.Ordinal);
    }

    [Fact]
    public void Plan_ManyShortSegments_IsOneChain()
    {
        // A circle of 2,000 points 0.05 mm apart, rounded by 0.02 mm.
        const int Count = 2000;
        var radius = Count * 0.05e-3 / (2 * Math.PI);
        var waypoints = Enumerable.Range(0, Count + 1).Select(i =>
        {
            var (sin, cos) = Math.SinCos(2 * Math.PI * i / Count);
            return At(radius * cos, radius * sin) with { Speed = 0.05, CornerReach = i is 0 or Count ? 0 : 0.02e-3 };
        }).ToArray();
        var plan = Plan(Controller, waypoints);
        Assert.Empty(plan.Problems);
        Assert.Single(plan.Moves);

        // One ramp up, one down: D/V + V/A on the length a little shortened by roundings.
        Approximately.Equal(0.1 / 0.05 + 0.05 / 2, Duration(plan), 1e-3, "duration (s)");
    }

    [Fact]
    public void Plan_TwoHundredThousandWaypoints_GrowsWithTheirNumber()
    {
        // Work proportional to the number of points: a quadratic planner would need hours and time out.
        var waypoints = Enumerable.Range(0, 200_000).Select(i => At(i * 0.05e-3, (i % 2) * 0.01e-3) with { CornerReach = 0.01e-3, Speed = 0.1 }).ToArray();
        var plan = Plan(Controller, waypoints);
        Assert.Empty(plan.Problems);
        Assert.Single(plan.Moves);
    }

    [Fact]
    public void Plan_JointMoveWithoutSpeedLimit_IsRefused()
    {
        var plan = Plan(Controller, At(0, 0), At(0.1, 0) with { Motion = MotionKind.Joint });
        Assert.Contains(plan.Problems, p => p.Quantity == "speed limit of joint 1");
    }

    [Fact]
    public void JointTrajectory_AnyLaw_StartsAndStopsTogetherWithinLimits()
    {
        var arm = TestArms.SixJoints(new JointLimits { Speed = new(2, "invented"), Acceleration = new(8, "invented") });
        ImmutableArray<double> from = [0, 0, 0, 0, 0, 0];
        ImmutableArray<double> to = [1, -0.5, 0.2, 0, 2, -0.1];
        foreach (var law in Enum.GetValues<TimeLaw>())
        {
            var trajectory = JointTrajectory.Plan(arm, from, to, 0.5, law);
            var (joints, speeds, fastest) = (new double[6], new double[6], 0.0);
            for (var i = 0; i <= 10_000; i++)
            {
                trajectory.At(trajectory.Duration * i / 10_000, joints, speeds);
                fastest = Math.Max(fastest, speeds.Max(Math.Abs));
                for (var j = 0; j < 6; j++)
                {
                    // All joints have gone the same share of their way.
                    Approximately.Equal(to[j] * joints[0], joints[j], Rounding, $"{law}, joint {j + 1}");
                }
            }

            Assert.True(fastest <= 1 + 1e-9, $"{law}: {fastest} rad/s at half of 2 rad/s");
            Approximately.Equal(to.ToArray(), joints, Rounding, law.ToString());
        }
    }

    private static Waypoint At(double x, double y) => LoopScenarios.Point(new(x, y, 0), UnitQuaternion.Identity);

    private static PathPlan Plan(ControllerSettings controller, params Waypoint[] waypoints) =>
        PathPlanner.Plan(new([.. waypoints]), TestArms.SixJoints(), controller);

    private static double Duration(PathPlan plan) => plan.Moves.Sum(m => m is ChainMove chain ? chain.Chain.Duration : ((DwellMove)m).Duration);

    private static IEnumerable<ReferenceState> Sample(PathPlan plan, int count)
    {
        var chain = ((ChainMove)Assert.Single(plan.Moves)).Chain;
        return Enumerable.Range(0, count + 1).Select(i => chain.At(chain.Duration * i / count));
    }
}
