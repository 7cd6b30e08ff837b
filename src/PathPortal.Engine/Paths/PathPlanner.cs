using System.Collections.Immutable;
using System.Globalization;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Control;
using PathPortal.Engine.Geometry;

namespace PathPortal.Engine.Paths;

/// <summary>
/// Plans a path for a controller: chains between stops with rounded corners, dwells, joint moves. Work is proportional to the number of waypoints.
/// </summary>
/// <remarks>
/// The tool stops at a waypoint without corner reach, before and after joint moves and turns on the spot, and at the end. Between stops one time law
/// runs over the whole length: the trapezoidal law keeps each segment's programmed speed where acceleration lets it, polynomial laws take the
/// slowest of the chain. Every speed is cut where the tool would turn faster than it may, and in corners where v²/ρ would pass the tool acceleration.
/// </remarks>
internal sealed class PathPlanner
{
    // Sharper than this a corner turns back on itself: the parabola folds up and its radius goes to zero.
    private const double LargestTurn = 170 * Math.PI / 180;

    // Roundings that meet in the middle of a segment touch in written decimals, not in bits.
    private const double OverlapTolerance = 1e-9; // m

    private readonly ImmutableArray<Waypoint> waypoints;
    private readonly ControllerSettings controller;
    private readonly Segment?[] segments;
    private readonly ImmutableArray<PlanProblem>.Builder problems = ImmutableArray.CreateBuilder<PlanProblem>();
    private readonly ImmutableArray<string>.Builder remarks = ImmutableArray.CreateBuilder<string>();

    private PathPlanner(ToolPath path, ControllerSettings controller)
    {
        waypoints = path.Waypoints;
        this.controller = controller;
        segments = new Segment?[waypoints.Length];
    }

    /// <summary>Plans a path whose numbers <see cref="PathCheck"/> has found sound.</summary>
    public static PathPlan Plan(ToolPath path, ArmModel arm, ControllerSettings controller) => new PathPlanner(path, controller).Plan(arm);

    private PathPlan Plan(ArmModel arm)
    {
        var travel = 0.0;
        for (var i = 1; i < waypoints.Length; i++)
        {
            if (waypoints[i].Motion == MotionKind.Straight)
            {
                segments[i] = new(waypoints[i - 1], waypoints[i], i, travel);
                travel = segments[i]!.EndTravel;
            }
        }

        CheckCorners();
        CheckJointMoves(arm);
        return new()
        {
            Moves = problems.Count == 0 ? Moves() : [],
            Segments = [.. segments],
            Begin = Place(0, 0),
            Length = travel,
            Problems = problems.ToImmutable(),
            Remarks = remarks.ToImmutable(),
        };
    }

    private ImmutableArray<PlannedMove> Moves()
    {
        var moves = ImmutableArray.CreateBuilder<PlannedMove>();
        var pieces = new List<ChainPiece>();
        var travel = 0.0;
        AddDwell(moves, 0, travel);
        for (var i = 1; i < waypoints.Length; i++)
        {
            if (segments[i] is not { } segment)
            {
                moves.Add(new JointMove(i, Place(i, travel)));
                AddDwell(moves, i, travel);
                continue;
            }

            travel = segment.EndTravel;
            if (segment.Length > 0)
            {
                AddStraight(pieces, i, segment);
            }
            else if (segment.TurnAngle > 0)
            {
                pieces.Add(new TurnPiece(segment, controller));
            }
            else if (waypoints[i].Dwell == 0)
            {
                Remark(i, "repeats the point before; nothing happens there");
            }

            if (!IsRounded(i) && pieces.Count > 0)
            {
                moves.Add(new ChainMove(new(pieces, controller)));
                pieces.Clear();
            }

            AddDwell(moves, i, travel);
        }

        return moves.ToImmutable();
    }

    // The straight part of a segment and, where its end is rounded, the corner after it.
    private void AddStraight(List<ChainPiece> pieces, int i, Segment segment)
    {
        var from = IsRounded(i - 1) ? waypoints[i - 1].CornerReach : 0;
        var to = segment.Length - (IsRounded(i) ? waypoints[i].CornerReach : 0);
        if (to - from > OverlapTolerance)
        {
            pieces.Add(new StraightPiece(segment, from, to, controller));
        }

        if (IsRounded(i))
        {
            pieces.Add(new CornerPiece(segment, segments[i + 1]!, waypoints[i].CornerReach, controller));
        }
    }

    private void AddDwell(ImmutableArray<PlannedMove>.Builder moves, int i, double travel)
    {
        if (waypoints[i].Dwell > 0)
        {
            moves.Add(new DwellMove(Place(i, travel), waypoints[i].Dwell));
        }
    }

    // Rounded: a reach, and straight motion on both sides.
    private bool IsRounded(int i) => i > 0 && i + 1 < waypoints.Length && waypoints[i].CornerReach > 0
        && segments[i] is not null && segments[i + 1] is not null;

    private void CheckCorners()
    {
        for (var i = 0; i < waypoints.Length; i++)
        {
            if (!IsRounded(i))
            {
                if (waypoints[i].CornerReach > 0)
                {
                    Remark(i, "has a corner reach, but the tool stops there: a corner needs straight motion before and after");
                }

                continue;
            }

            var reach = waypoints[i].CornerReach;
            CheckRoom(i, segments[i]!.Length, reach, IsRounded(i - 1) ? waypoints[i - 1].CornerReach : 0, "before");
            CheckRoom(i, segments[i + 1]!.Length, reach, IsRounded(i + 1) ? waypoints[i + 1].CornerReach : 0, "after");
            var (before, after) = (segments[i]!.Direction, segments[i + 1]!.Direction);
            var turn = Deterministic.Atan2(before.Cross(after).Norm, before.Dot(after));
            if (turn > LargestTurn)
            {
                Problem(i, "change of direction", turn * 180 / Math.PI, "degrees", "is too sharp to round (at most 170); let the tool stop there");
            }
        }
    }

    private void CheckRoom(int i, double length, double reach, double neighbour, string side)
    {
        if (reach + neighbour > length + OverlapTolerance)
        {
            var room = InputText.Of(Math.Max(0, length - neighbour));
            Problem(i, "corner reach", reach, "m", $"must be at most {room} m, what the straight {side} it leaves: roundings may not overlap");
        }
    }

    private void CheckJointMoves(ArmModel arm)
    {
        for (var i = 1; i < waypoints.Length; i++)
        {
            if (waypoints[i].Motion != MotionKind.Joint)
            {
                continue;
            }

            for (var j = 0; j < arm.Joints.Length; j++)
            {
                if (arm.Joints[j].Limits.Speed is not { Value: > 0 })
                {
                    Problem(i, $"speed limit of joint {j + 1}", double.NaN, "", "must be given: a joint move runs at a share of it");
                }
            }
        }
    }

    private PathPoint Place(int i, double travel) =>
        new(waypoints[i].Position, waypoints[i].Orientation, Vector3D.Zero, Vector3D.Zero, i, travel);

    private void Problem(int i, string quantity, double value, string unit, string expected)
    {
        if (problems.Count < InputCheck.Most)
        {
            problems.Add(new(i, waypoints[i].SourceLine, quantity, value, unit, expected));
        }
    }

    private void Remark(int i, string text)
    {
        if (remarks.Count < InputCheck.Most)
        {
            var line = waypoints[i].SourceLine > 0 ? string.Create(CultureInfo.InvariantCulture, $" (line {waypoints[i].SourceLine})") : "";
            remarks.Add(string.Create(CultureInfo.InvariantCulture, $"Waypoint {i + 1}{line} {text}."));
        }
    }
}
