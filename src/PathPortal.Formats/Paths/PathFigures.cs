using System.Collections.Immutable;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;

namespace PathPortal.Formats.Paths;

/// <summary>Counts and measures a path.</summary>
internal static class PathFigures
{
    public static PathReport Of(ToolPath path, ImmutableArray<JointKind> postureKinds)
    {
        var points = path.Waypoints;
        var (low, high) = (points[0].Position, points[0].Position);
        var (straight, joint, length, process) = (0, 0, 0.0, 0.0);
        for (var i = 1; i < points.Length; i++)
        {
            var p = points[i].Position;
            low = new(Math.Min(low.X, p.X), Math.Min(low.Y, p.Y), Math.Min(low.Z, p.Z));
            high = new(Math.Max(high.X, p.X), Math.Max(high.Y, p.Y), Math.Max(high.Z, p.Z));
            if (points[i].Motion == MotionKind.Joint)
            {
                joint++;
                continue;
            }

            straight++;
            var step = (p - points[i - 1].Position).Norm;
            length += step;
            process += points[i].ProcessOn ? step : 0;
        }

        return new()
        {
            Points = points.Length,
            StraightMoves = straight,
            JointMoves = joint,
            StraightLength = length,
            ProcessLength = process,
            Low = low,
            High = high,
            PostureKinds = postureKinds,
        };
    }
}
