namespace PathPortal.Engine.Paths;

/// <summary>Checks a path for what no simulation can run on. Waypoints are counted from 1 in messages.</summary>
internal static class PathCheck
{
    public const int MostWaypoints = 200_000;

    /// <param name="joints">Number of joints of the arm that is to follow the path.</param>
    public static void Check(ToolPath path, int joints, InputCheck check)
    {
        var count = path.Waypoints.IsDefault ? 0 : path.Waypoints.Length;
        if (count is < 2 or > MostWaypoints)
        {
            check.Add("path", "number of waypoints", count, "1", $"must be 2 to {MostWaypoints}");
            return;
        }

        for (var i = 0; i < count && !check.IsFull; i++)
        {
            Check($"waypoint {i + 1}", path.Waypoints[i], i == 0, joints, check);
        }
    }

    /// <summary>A lower bound of the time the path takes (s): straight lengths at programmed speed, and dwells.</summary>
    public static double LeastTime(ToolPath path)
    {
        var time = 0.0;
        for (var i = 0; i < path.Waypoints.Length; i++)
        {
            var waypoint = path.Waypoints[i];
            time += waypoint.Dwell;
            if (i > 0 && waypoint.Motion == MotionKind.Straight)
            {
                time += (waypoint.Position - path.Waypoints[i - 1].Position).Norm / waypoint.Speed;
            }
        }

        return time;
    }

    private static void Check(string place, Waypoint waypoint, bool isFirst, int joints, InputCheck check)
    {
        check.Point(place, "position", waypoint.Position);
        if (waypoint.Position.IsFinite && !(waypoint.Position.Norm <= InputCheck.FurthestPoint))
        {
            check.Add(place, "distance from the work frame", waypoint.Position.Norm, "m", $"must be at most {InputCheck.FurthestPoint} m");
        }

        check.Orientation(place, waypoint.Orientation);
        check.Known(place, "motion", waypoint.Motion);
        check.Known(place, "task", waypoint.Task);
        check.NotNegative(place, "corner reach", waypoint.CornerReach, "m");
        check.NotNegative(place, "lead-in", waypoint.LeadIn, "m");
        check.NotNegative(place, "dwell", waypoint.Dwell, "s");
        if (waypoint is { Dwell: > 0, CornerReach: > 0 })
        {
            check.Add(place, "dwell", waypoint.Dwell, "s", "must be zero where the corner is rounded: the tool does not stop there");
        }

        if (waypoint.Joints is { } posture)
        {
            Joints(place, posture.AsSpan(), joints, check);
        }

        if (isFirst)
        {
            return;
        }

        if (waypoint.Motion == MotionKind.Joint)
        {
            check.Share(place, "joint speed share", waypoint.JointSpeedShare);
            return;
        }

        check.Above(place, "speed", waypoint.Speed, 0, "m/s");
        var rows = waypoint.Task switch { TaskKind.Pose => 6, TaskKind.Axis => 5, _ => 3 };
        if (rows > joints)
        {
            check.Add(place, "constrained directions", rows, "1", $"must be at most the number of joints, {joints}");
        }
    }

    internal static void Joints(string place, ReadOnlySpan<double> values, int joints, InputCheck check)
    {
        if (values.Length != joints)
        {
            check.Add(place, "number of joint values", values.Length, "1", $"must be the number of joints, {joints}");
            return;
        }

        for (var i = 0; i < values.Length; i++)
        {
            check.Finite(place, $"joint {i + 1}", values[i], "rad or m");
        }
    }
}
