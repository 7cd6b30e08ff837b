using System.Globalization;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;
using PathPortal.Formats.Problems;

namespace PathPortal.Formats.Paths;

/// <summary>What only neighbouring rows show: points that don't move, corners that overlap, settings where they mean nothing.</summary>
internal sealed class PathChecks(PathRows rows, PathLayout layout, ProblemList problems)
{
    // Below these nothing moves that a controller or an eye could tell (1 nm, about 2e-7 degrees).
    private const double SamePlaceM = 1e-9;
    private const double SameTurnRad = 4e-9;

    // A parabola through a sharper corner folds up.
    private const double SharpestTurnRad = 170 * Math.PI / 180;

    private readonly int _cornerAt = layout.IndexOf(PathQuantity.Corner);
    private readonly int _leadInAt = layout.IndexOf(PathQuantity.LeadIn);
    private readonly int _processAt = layout.IndexOf(PathQuantity.Process);

    private int Count => rows.Waypoints.Count;

    public void Run()
    {
        if (Count < 2)
        {
            problems.Add(
                Count == 0 ? 0 : rows.Waypoints[0].SourceLine, 0, "", "", "two points or more: the first row is the start",
                Count == 0 ? "The path has no points." : "The path has only one point.");
            return;
        }

        for (var i = 0; i < Count; i++)
        {
            CheckMove(i);
            CheckCorner(i);
            CheckLeadIn(i);
        }
    }

    private void CheckMove(int i)
    {
        var point = rows.Waypoints[i];
        if (point.Joints is not null && (i == 0 || point.Motion == MotionKind.Straight))
        {
            Wrong(
                i, layout.Posture[0], "blank joint cells",
                i == 0 ? "The start posture is not part of the path: it belongs to the program's assignment to a cell." : "A posture is given for a straight move; only joint moves end in a posture.");
        }

        if (i == 0)
        {
            return;
        }

        var before = rows.Waypoints[i - 1];
        var still = (point.Position - before.Position).Norm <= SamePlaceM
            && RotationVector.AngleBetween(before.Orientation, point.Orientation) <= SameTurnRad
            && (point.Motion == MotionKind.Straight || point.Joints is null);
        if (still)
        {
            Wrong(
                i, layout.Position[0], "another point or another orientation; to wait at a point give dwell_s",
                string.Create(CultureInfo.InvariantCulture, $"The point is the same as that of line {before.SourceLine}."));
        }

        if (point.Motion == MotionKind.Joint && point.ProcessOn)
        {
            Wrong(i, _processAt, "off", "The process is on during a joint move; joint moves are for moves in air.");
        }
    }

    private void CheckCorner(int i)
    {
        var point = rows.Waypoints[i];
        if (point.CornerReach == 0)
        {
            return;
        }

        if (i == 0 || i == Count - 1)
        {
            Remark(
                i, _cornerAt,
                i == 0 ? "The path starts here: the corner is not rounded." : "The path ends here: the corner is not rounded.");
            rows.Waypoints[i] = point with { CornerReach = 0 };
            return;
        }

        if (point.Motion == MotionKind.Joint || rows.Waypoints[i + 1].Motion == MotionKind.Joint)
        {
            Wrong(i, _cornerAt, "0 or blank", "A corner is rounded only between two straight moves.");
        }
        else if (point.Dwell > 0)
        {
            Wrong(i, _cornerAt, "0 or blank, or no dwell", "The tool cannot wait at a corner it does not stop in.");
        }
        else
        {
            CheckSharpness(i);
            CheckReach(i, i - 1, rows.Waypoints[i - 1].CornerReach);
            if (i + 1 == Count - 1 || rows.Waypoints[i + 1].CornerReach == 0)
            {
                CheckReach(i, i + 1, 0);
            }
        }
    }

    private void CheckSharpness(int i)
    {
        var before = rows.Waypoints[i].Position - rows.Waypoints[i - 1].Position;
        var after = rows.Waypoints[i + 1].Position - rows.Waypoints[i].Position;
        var turn = Math.Atan2(before.Cross(after).Norm, before.Dot(after));
        if (turn > SharpestTurnRad)
        {
            Wrong(
                i, _cornerAt, "0 or blank: the tool stops where the path turns back on itself",
                string.Create(CultureInfo.InvariantCulture, $"The path turns by {turn * 180 / Math.PI:F1} degrees here, too sharp to round (at most 170)."));
        }
    }

    // The roundings at both ends of a straight must leave it some length.
    private void CheckReach(int i, int neighbour, double otherReach)
    {
        var (point, other) = (rows.Waypoints[i], rows.Waypoints[neighbour]);
        var length = (point.Position - other.Position).Norm;
        if (!(point.CornerReach + otherReach <= length + SamePlaceM))
        {
            Wrong(
                i, _cornerAt,
                string.Create(CultureInfo.InvariantCulture, $"at most {Math.Max(0, length - otherReach) * 1000:G6} mm"),
                string.Create(
                    CultureInfo.InvariantCulture,
                    $"Corner roundings overlap: the straight to or from line {other.SourceLine} is {length * 1000:G6} mm long, {otherReach * 1000:G6} mm of it already taken."));
        }
    }

    private void CheckLeadIn(int i)
    {
        var point = rows.Waypoints[i];
        if (point.LeadIn == 0)
        {
            return;
        }

        var begins = i > 0 && point.ProcessOn && (i == 1 || !rows.Waypoints[i - 1].ProcessOn);
        if (!begins)
        {
            Remark(i, _leadInAt, "No process section begins with this row: the lead-in is ignored.");
            rows.Waypoints[i] = point with { LeadIn = 0 };
            return;
        }

        var section = 0.0;
        for (var k = i; k < Count && rows.Waypoints[k].ProcessOn && section <= point.LeadIn; k++)
        {
            section += (rows.Waypoints[k].Position - rows.Waypoints[k - 1].Position).Norm;
        }

        if (section <= point.LeadIn)
        {
            Remark(i, _leadInAt, "The lead-in is as long as the whole process section: nothing of it will be judged.");
        }
    }

    private void Wrong(int i, int at, string expected, string message)
    {
        var (line, column, shown) = rows.PlaceOf(i, at);
        problems.Add(line, column, layout.Columns[at].Name, shown, expected, message);
    }

    private void Remark(int i, int at, string message)
    {
        var (line, column, _) = rows.PlaceOf(i, at);
        problems.Remark(line, column, layout.Columns[at].Name, message);
    }
}
