using System.Globalization;
using PathPortal.Engine.Paths;
using PathPortal.Formats.Problems;

namespace PathPortal.Formats.Paths;

/// <summary>Remarks on an accepted path that looks as if units were mixed up, or that says less than its author may think.</summary>
internal static class PathPlausibility
{
    // Work of an arm spans more than this (common practice, no source).
    private const double SmallWorkM = 0.005;

    // No usual arm reaches farther (common practice, no source).
    private const double LargeWorkM = 10;

    private const double SlowestUsualSpeed = 0.001;
    private const double FastestUsualSpeed = 10;

    public static void Remark(PathRows rows, PathLayout layout, ProblemList problems)
    {
        RemarkLengths(rows, layout, problems);
        RemarkAngles(rows.Orientation, layout, problems);
        RemarkSpeeds(rows, layout, problems);
        RemarkOrientations(rows, layout, problems);
        RemarkDefaults(rows, layout, problems);
    }

    private static void RemarkLengths(PathRows rows, PathLayout layout, ProblemList problems)
    {
        var farthest = 0.0;
        foreach (var point in rows.Waypoints)
        {
            var p = point.Position;
            farthest = Math.Max(farthest, Math.Max(Math.Abs(p.X), Math.Max(Math.Abs(p.Y), Math.Abs(p.Z))));
        }

        var unit = layout.Columns[layout.Position[0]].Unit;
        var names = string.Join(", ", layout.Position.Select(c => layout.Columns[c].Name));
        if (unit == "mm" && farthest < SmallWorkM)
        {
            problems.Remark(
                0, 0, names,
                string.Create(CultureInfo.InvariantCulture, $"No coordinate is larger than {farthest * 1000:G4} mm. Are these metres?"));
        }
        else if (unit == "m" && farthest > LargeWorkM)
        {
            problems.Remark(
                0, 0, names, string.Create(CultureInfo.InvariantCulture, $"Coordinates reach {farthest:G4} m. Are these millimetres?"));
        }
    }

    private static void RemarkAngles(PathOrientation orientation, PathLayout layout, ProblemList problems)
    {
        if (layout.OrientationKind != PathQuantity.Angles)
        {
            return;
        }

        var names = string.Join(", ", layout.Orientation.Select(c => layout.Columns[c].Name));
        if (layout.Columns[layout.Orientation[0]].Unit == "deg" && orientation is { WholeAngles: false, LargestAngle: <= 2 * Math.PI })
        {
            problems.Remark(
                0, 0, names,
                string.Create(CultureInfo.InvariantCulture, $"No angle is larger than {orientation.LargestAngle:G5} degrees. Are these radians?"));
        }
        else if (layout.Columns[layout.Orientation[0]].Unit == "rad" && orientation.LargestAngle > 2 * Math.PI)
        {
            problems.Remark(
                0, 0, names,
                string.Create(CultureInfo.InvariantCulture, $"Angles reach {orientation.LargestAngle:G5} rad, more than one turn. Are these degrees?"));
        }
    }

    private static void RemarkSpeeds(PathRows rows, PathLayout layout, ProblemList problems)
    {
        var at = layout.IndexOf(PathQuantity.Speed);
        var moves = rows.Waypoints.Skip(1).Where(p => p.Motion == MotionKind.Straight).Select(p => p.Speed).ToArray();
        if (at < 0 || moves.Length == 0)
        {
            return;
        }

        var (slowest, fastest) = (moves.Min(), moves.Max());
        if (layout.Columns[at].Unit == "mm/s" && fastest < SlowestUsualSpeed)
        {
            problems.Remark(
                0, 0, layout.Columns[at].Name,
                string.Create(CultureInfo.InvariantCulture, $"No speed is above {fastest * 1000:G4} mm/s. Are these metres per second?"));
        }
        else if (fastest > FastestUsualSpeed)
        {
            problems.Remark(
                0, 0, layout.Columns[at].Name,
                string.Create(CultureInfo.InvariantCulture, $"Speeds run from {slowest:G4} to {fastest:G4} m/s. Is the unit right?"));
        }
    }

    private static void RemarkOrientations(PathRows rows, PathLayout layout, ProblemList problems)
    {
        if (rows.Orientation.ScaledRows > 0)
        {
            problems.Remark(
                rows.Orientation.FirstScaledLine, 0, "qw, qx, qy, qz",
                string.Create(CultureInfo.InvariantCulture, $"{rows.Orientation.ScaledRows} quaternion(s) have a norm that differs from 1 by more than 0.001, this one first; they were scaled to 1."));
        }

        if (!layout.ByToolAxis)
        {
            return;
        }

        for (var i = 1; i < rows.Waypoints.Count; i++)
        {
            if (rows.Waypoints[i].Task == TaskKind.Pose)
            {
                problems.Remark(
                    rows.Waypoints[i].SourceLine, 0, "task",
                    "The task is “pose”, but a tool axis leaves the turn about it open. The turn was chosen: at the start the shortest from the work frame's z axis, then no turn about the axis from row to row.");
                return;
            }
        }
    }

    private static void RemarkDefaults(PathRows rows, PathLayout layout, ProblemList problems)
    {
        if (layout.IndexOf(PathQuantity.JointSpeed) < 0 && rows.Waypoints.Skip(1).Any(p => p.Motion == MotionKind.Joint))
        {
            problems.Remark(0, 0, "joint_speed_percent", "No joint speed is given: joint moves use 50 % of the joint speed limits.");
        }

        if (!rows.Waypoints.Any(p => p.ProcessOn))
        {
            problems.Remark(0, 0, "process", "The process is never on: criteria about the process have nothing to judge.");
        }
    }
}
