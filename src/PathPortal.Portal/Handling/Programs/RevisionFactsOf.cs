using PathPortal.Engine.Paths;
using PathPortal.Formats.Paths;
using PathPortal.Portal.Domain.Programs;

namespace PathPortal.Portal.Handling.Programs;

/// <summary>From what the reader found to what a revision's row keeps.</summary>
internal static class RevisionFactsOf
{
    public static RevisionFacts File(PathFile file, IReadOnlyList<string> remarks)
    {
        var report = file.Report;
        return new(
            report.Points, report.StraightLength, PlannedTime(file.Path),
            [report.Low.X, report.Low.Y, report.Low.Z], [report.High.X, report.High.Y, report.High.Z], remarks);
    }

    /// <summary>
    /// Time of straight moves at their programmed speed and of dwells (s): what the file alone says. Ramps, corners, turns and joint moves
    /// depend on the cell. Null where a joint move makes even that too little to be of use.
    /// </summary>
    private static double? PlannedTime(ToolPath path)
    {
        var time = 0.0;
        for (var i = 1; i < path.Waypoints.Length; i++)
        {
            var point = path.Waypoints[i];
            time += point.Dwell;
            if (point.Motion != MotionKind.Joint && point.Speed > 0)
                time += (point.Position - path.Waypoints[i - 1].Position).Norm / point.Speed;
        }
        return path.Waypoints.Skip(1).All(p => p.Motion == MotionKind.Joint) || !double.IsFinite(time) ? null : time;
    }
}
