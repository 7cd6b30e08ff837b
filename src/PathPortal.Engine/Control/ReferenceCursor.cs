using System.Collections.Immutable;
using System.Globalization;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;
using PathPortal.Engine.Postures;
using PathPortal.Engine.Stepping;

namespace PathPortal.Engine.Control;

/// <summary>
/// The reference of one simulation as its own clock runs: which move of the plan it is on and since when. Joint moves are planned when their time
/// comes, from the posture this arm then has. Not safe between threads.
/// </summary>
internal sealed class ReferenceCursor
{
    // A move's end within this share of a period counts as reached: sums of durations round.
    private const double EndTolerance = 1e-6;

    // A given posture is finished by Newton to the exact pose; one that is off by more than this was given for another pose.
    private const double LargestPostureGapRevolute = Math.PI / 180;
    private const double LargestPostureGapPrismatic = 1e-3;

    private readonly Scenario scenario;
    private readonly PathPlan plan;
    private readonly PostureFinder finder;
    private readonly RigidTransform X_BW;
    private readonly double tolerance;
    private ImmutableArray<double> lastJoints;
    private int move;
    private double moveStart;

    // The joint move under way or last made, which holds its end until tool-space motion follows.
    private JointTrajectory? trajectory;
    private double trajectoryStart;
    private int entered = -1;

    public ReferenceCursor(Scenario scenario, PathPlan plan, PostureFinder finder, ImmutableArray<double> start)
    {
        (this.scenario, this.plan, this.finder) = (scenario, plan, finder);
        X_BW = scenario.Cell.BaseInCell.Inverse() * scenario.Cell.WorkInCell;
        tolerance = EndTolerance * scenario.Controller.Period;
        lastJoints = start;
        if (plan.Moves.FirstOrDefault(m => m is not DwellMove) is JointMove)
        {
            trajectory = JointTrajectory.Hold(start);
        }
    }

    /// <summary>True once the clock has passed the last move.</summary>
    public bool Finished => move >= plan.Moves.Length;

    /// <summary>When the reference came to the end of its last move (s).</summary>
    public double EndTime => moveStart;

    /// <summary>Why a joint move could not be planned; null where all is well.</summary>
    public string? Failure { get; private set; }

    /// <summary>On a joint-interpolated move, or at rest after one.</summary>
    public bool IsJointMove => trajectory is not null;

    /// <summary>Index of the move the clock is on; as many as there are moves once it has passed the last.</summary>
    public int Move => move;

    /// <summary>True where this cursor would give exactly what the other gives.</summary>
    public bool IsSameAs(ReferenceCursor other, double time, double otherTime) =>
        !IsJointMove && !other.IsJointMove && move == other.move && time - moveStart == otherTime - other.moveStart;

    /// <summary>Brings the cursor to a time of the reference clock (s), which never goes back.</summary>
    /// <param name="seen">Joint values as the controller sees them now: where a joint move's start is looked for.</param>
    public void Advance(double time, ReadOnlySpan<double> seen)
    {
        while (!Finished && Failure is null)
        {
            if (plan.Moves[move] is JointMove joint && entered != move)
            {
                Enter(joint, seen);
                if (Failure is not null)
                {
                    return;
                }
            }

            var duration = Duration(move);
            if (time < moveStart + duration - tolerance)
            {
                return;
            }

            moveStart += duration;
            move++;
            if (move < plan.Moves.Length && plan.Moves[move] is ChainMove)
            {
                trajectory = null;
            }
        }
    }

    /// <summary>
    /// The reference at a time (s) at or after the last <see cref="Advance"/>; it may look into the tool-space moves that follow, and holds before a
    /// joint move and at the end.
    /// </summary>
    public ReferenceState At(double time)
    {
        var (at, start) = (move, moveStart);
        while (at < plan.Moves.Length && plan.Moves[at] is not JointMove)
        {
            var duration = Duration(at);
            if (time <= start + duration || at + 1 == plan.Moves.Length || plan.Moves[at + 1] is JointMove)
            {
                return plan.Moves[at] is ChainMove chain ? chain.Chain.At(time - start) : Still(((DwellMove)plan.Moves[at]).Place);
            }

            start += duration;
            at++;
        }

        return plan.Moves.Length == 0 ? Still(plan.Begin) : plan.Moves[^1] switch
        {
            ChainMove last => last.Chain.At(double.MaxValue),
            DwellMove last => Still(last.Place),
            var last => Still(((JointMove)last).End),
        };
    }

    /// <summary>Joint values and speeds of the reference on a joint move.</summary>
    public void JointsAt(double time, Span<double> joints, Span<double> speeds) => trajectory!.At(time - trajectoryStart, joints, speeds);

    /// <summary>The waypoint the joint move ends at, with the programmed travel so far.</summary>
    public PathPoint JointMoveEnd => entered < 0 ? plan.Begin : ((JointMove)plan.Moves[entered]).End;

    /// <summary>Share of the plan's moves that is done at a time (s), for progress only.</summary>
    public double ShareAt(double time)
    {
        if (Finished)
        {
            return 1;
        }

        var duration = plan.Moves[move] is JointMove && entered != move ? 0 : Duration(move);
        return (move + (duration > 0 ? Math.Clamp((time - moveStart) / duration, 0, 1) : 0)) / plan.Moves.Length;
    }

    private static ReferenceState Still(PathPoint place) => new(place, Vector3D.Zero, Vector3D.Zero);

    private double Duration(int index) => plan.Moves[index] switch
    {
        ChainMove chain => chain.Chain.Duration,
        DwellMove dwell => dwell.Duration,
        _ => trajectory!.Duration,
    };

    private void Enter(JointMove joint, ReadOnlySpan<double> seen)
    {
        if (trajectory is null)
        {
            if (seen.ContainsAnyExceptInRange(-LaneMath.LargestAngle, LaneMath.LargestAngle))
            {
                Failure = string.Create(
                    CultureInfo.InvariantCulture, $"A joint value had run away before the joint move to waypoint {joint.Waypoint + 1}.");
                return;
            }

            // The loop is near the last programmed pose, not on it; the move starts from the posture that is.
            var before = scenario.Path.Waypoints[joint.Waypoint - 1];
            if (finder.Continue(PoseOf(before), seen, before.Task) is not { } from)
            {
                Failure = string.Create(
                    CultureInfo.InvariantCulture, $"The joint move to waypoint {joint.Waypoint + 1} can't start: waypoint {joint.Waypoint} is out of reach.");
                return;
            }

            lastJoints = from;
        }

        if (End(joint.Waypoint) is not { } to)
        {
            return;
        }

        var target = scenario.Path.Waypoints[joint.Waypoint];
        trajectory = JointTrajectory.Plan(scenario.Arm, lastJoints, to, target.JointSpeedShare, scenario.Controller.TimeLaw);
        (lastJoints, trajectoryStart, entered) = (to, moveStart, move);
    }

    private ImmutableArray<double>? End(int waypoint)
    {
        var target = scenario.Path.Waypoints[waypoint];
        var name = string.Create(CultureInfo.InvariantCulture, $"waypoint {waypoint + 1}");
        if (target.Joints is not { } given)
        {
            var nearest = finder.Nearest(PoseOf(target), lastJoints.AsSpan(), target.Task);
            Failure = nearest is null ? $"No posture inside the joint limits reaches {name}." : null;
            return nearest;
        }

        if (finder.Continue(PoseOf(target), given.AsSpan(), target.Task) is not { } finished)
        {
            Failure = $"The posture given for {name} does not lead to its pose.";
            return null;
        }

        for (var i = 0; i < given.Length; i++)
        {
            var revolute = scenario.Arm.Joints[i].Kind == JointKind.Revolute;
            var gap = Math.Abs(finished[i] - given[i]);
            if (!(gap <= (revolute ? LargestPostureGapRevolute : LargestPostureGapPrismatic)))
            {
                var size = revolute ? InputText.Of(gap * 180 / Math.PI) + "°" : InputText.Of(gap * 1000) + " mm";
                Failure = $"The posture given for {name} does not fit its pose: joint {i + 1} would have to move by {size}.";
                return null;
            }
        }

        return finished;
    }

    private RigidTransform PoseOf(Waypoint waypoint) =>
        X_BW * new RigidTransform(RotationMatrix.FromQuaternion(waypoint.Orientation), waypoint.Position);
}
