using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;
using PathPortal.Engine.Tests.Control;

namespace PathPortal.Engine.Tests.Paths;

/// <summary>Deviation from the programmed geometry, on figures whose distances are plain to see.</summary>
public sealed class ProgrammedTrackTests
{
    // Rounding of coordinates of order 0.1 m.
    private const double Rounding = 1e-15;

    [Fact]
    public void MoveTo_LaggingOnStraight_IsNoDeviation()
    {
        var track = Track(At(0, 0), At(0.1, 0));
        track.Begin(1);
        for (var i = 0; i <= 10; i++)
        {
            var deviation = track.MoveTo(new(0.005 * i, 0, 0), Vector3D.UnitZ, 1, 0.01 * i, isLast: false);
            Approximately.Equal(0, deviation.Across, Rounding, "across (m)");
        }
    }

    [Fact]
    public void MoveTo_BesideAndAbove_SplitsIntoComponents()
    {
        var track = Track(At(0, 0), At(0.1, 0));
        track.Begin(1);
        var tilted = new Vector3D(0, Math.Sin(0.01), Math.Cos(0.01));
        var deviation = track.MoveTo(new(0.03, 0.002, -0.001), tilted, 1, 0.05, isLast: false);
        Approximately.Equal(0.002, deviation.Across, Rounding, "across (m)");
        Approximately.Equal(0.001, deviation.StandOff, Rounding, "stand-off (m)");
        Approximately.Equal(0.01, deviation.Axis, Rounding, "tool axis (rad)");
    }

    [Fact]
    public void MoveTo_CornerCutAcross_ReadsTheCornersDistance()
    {
        // From 10 mm before the corner straight to 10 mm after it: the corner is 10/√2 mm from the way taken.
        var track = Track(At(0, 0), At(0.1, 0), At(0.1, 0.1));
        track.Begin(1);
        track.MoveTo(new(0.09, 0, 0), Vector3D.UnitZ, 1, 0.09, isLast: false);
        var deviation = track.MoveTo(new(0.1, 0.01, 0), Vector3D.UnitZ, 2, 0.11, isLast: false);
        Approximately.Equal(0.01 / Math.Sqrt(2), deviation.Across, Rounding, "across (m)");
    }

    [Fact]
    public void MoveTo_ArmStandsStill_ReadsWhatIsMissedAtTheEnd()
    {
        var track = Track(At(0, 0), At(0.1, 0), At(0.1, 0.1));
        track.Begin(1);
        track.MoveTo(new(0.02, 0, 0), Vector3D.UnitZ, 1, 0.02, isLast: false);
        var deviation = track.MoveTo(new(0.02, 0, 0), Vector3D.UnitZ, 2, 0.2, isLast: true);
        Approximately.Equal(Math.Sqrt(0.08 * 0.08 + 0.1 * 0.1), deviation.Across, Rounding, "across (m)");
    }

    [Fact]
    public void MoveTo_ClosedPath_DoesNotTakeTheEndForTheBeginning()
    {
        // A tool 2 mm beside the first side of a closed square is nearest to the last side's end, which the reference has not come to.
        var track = Track(At(0, 0), At(0.1, 0), At(0.1, 0.1), At(0, 0.1), At(0, 0));
        track.Begin(1);
        var deviation = track.MoveTo(new(0.001, 0.002, 0), Vector3D.UnitZ, 1, 0.002, isLast: false);
        Approximately.Equal(0.002, deviation.Across, Rounding, "across (m)");
        Assert.Equal(1, track.Waypoint);
    }

    [Fact]
    public void MoveTo_ToolRunsBack_NeverGoesBack()
    {
        var track = Track(At(0, 0), At(0.1, 0));
        track.Begin(1);
        track.MoveTo(new(0.05, 0, 0), Vector3D.UnitZ, 1, 0.05, isLast: false);
        var deviation = track.MoveTo(new(0.04, 0, 0), Vector3D.UnitZ, 1, 0.06, isLast: false);
        Approximately.Equal(0.05, track.Travel, Rounding, "travel (m)");
        Approximately.Equal(0.01, deviation.Across, Rounding, "across (m)");
    }

    [Fact]
    public void MoveTo_TurnOnTheSpot_FollowsTheTurn()
    {
        var turned = RotationVector.ToQuaternion(new(0.8, 0, 0));
        var track = Track(At(0, 0), At(0.1, 0), At(0.1, 0) with { Orientation = turned }, At(0.2, 0) with { Orientation = turned });
        track.Begin(1);
        track.MoveTo(new(0.1, 0, 0), Vector3D.UnitZ, 1, 0.1, isLast: false);
        var halfway = RotationVector.ToMatrix(new(0.4, 0, 0)).AxisZ;
        Approximately.Equal(0, track.MoveTo(new(0.1, 0, 0), halfway, 2, 0.1, isLast: false).Axis, 1e-14, "half way (rad)");
        var aside = RotationVector.ToMatrix(new(0.4, 0.02, 0)).AxisZ;
        Assert.InRange(track.MoveTo(new(0.1, 0, 0), aside, 2, 0.1, isLast: false).Axis, 0.015, 0.025);
    }

    private static Waypoint At(double x, double y) => LoopScenarios.Point(new(x, y, 0), UnitQuaternion.Identity);

    private static ProgrammedTrack Track(params Waypoint[] waypoints) =>
        new(PathPlanner.Plan(new([.. waypoints]), TestArms.SixJoints(), LoopScenarios.Controller).Segments);
}
