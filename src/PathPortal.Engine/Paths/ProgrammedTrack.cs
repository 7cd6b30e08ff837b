using System.Collections.Immutable;
using PathPortal.Engine.Geometry;

namespace PathPortal.Engine.Paths;

/// <summary>
/// Follows the tool along the programmed geometry, corners not rounded, forward only. At every sample the tool belongs to the nearest place between
/// where it was and where the reference has come, so that it never falls back and never takes a later pass over the same place for this one. What it
/// leaves out on the way is measured the other way round: from each programmed corner it passed by to its own motion in that interval. So neither a cut
/// corner nor an arm that stands still reads zero. Not safe between threads.
/// </summary>
internal sealed class ProgrammedTrack(ImmutableArray<Segment?> segments)
{
    private int at;
    private double distance;
    private double turnShare;
    private Vector3D lastPoint;
    private bool started;

    /// <summary>Programmed travel at the tool's place (m).</summary>
    public double Travel => segments[at]!.StartTravel + distance;

    /// <summary>Index of the waypoint the tool's place lies before.</summary>
    public int Waypoint => at;

    /// <summary>Puts the tool at the begin of a segment: after a joint move, or at the start.</summary>
    /// <param name="waypoint">Index of the waypoint the segment ends at.</param>
    public void Begin(int waypoint)
    {
        (at, distance, turnShare, started) = (waypoint, 0, 0, false);
    }

    /// <summary>Moves on to a sample.</summary>
    /// <param name="point">True tool centre point (m, W).</param>
    /// <param name="axis">True tool axis, unit vector in W.</param>
    /// <param name="lastWaypoint">Index of the waypoint the furthest allowed place lies before.</param>
    /// <param name="furthest">Programmed travel of the furthest allowed place (m).</param>
    /// <param name="isLast">The run over these segments ends here: what is left up to the furthest place is missed.</param>
    public PathDeviation MoveTo(Vector3D point, Vector3D axis, int lastWaypoint, double furthest, bool isLast)
    {
        var from = at;
        Project(point, lastWaypoint, furthest);
        var here = At(axis);
        var deviation = PathDeviation.Between(point, axis, here.Position, here.Axis);
        if (at < lastWaypoint && segments[at + 1] is { Length: 0, TurnAngle: > 0 } turn)
        {
            // The reference turns on the spot ahead: a tool that turns along is not at fault, even a little before the spot.
            turnShare = NearestShare(turn, axis, turnShare);
            var turned = PathDeviation.Between(point, axis, here.Position, AxisOf(turn, turnShare));
            deviation = deviation with { Axis = Math.Min(deviation.Axis, turned.Axis) };
        }

        var begin = started ? lastPoint : point;
        deviation = deviation.Worse(PassedBy(from, at, begin, point));
        if (isLast)
        {
            deviation = deviation.Worse(Missed(point, lastWaypoint, furthest));
        }

        (lastPoint, started) = (point, true);
        return deviation;
    }

    private void Project(Vector3D point, int lastWaypoint, double furthest)
    {
        var (best, bestDistance, bestGap) = (at, distance, double.PositiveInfinity);
        for (var i = at; i <= lastWaypoint && segments[i] is { } segment; i++)
        {
            var low = i == at ? distance : 0;
            var high = i == lastWaypoint ? Math.Clamp(furthest - segment.StartTravel, low, Math.Max(low, segment.Length)) : segment.Length;
            var foot = Math.Clamp((point - segment.Start).Dot(segment.Direction), low, Math.Max(low, high));
            var gap = (segment.Start + foot * segment.Direction - point).Norm;
            if (gap < bestGap)
            {
                (best, bestDistance, bestGap) = (i, foot, gap);
            }
        }

        if (best != at)
        {
            turnShare = 0;
        }

        (at, distance) = (best, bestDistance);
    }

    // The programmed place the tool is at. On a turn on the spot the nearest orientation from the last one on.
    private (Vector3D Position, Vector3D Axis) At(Vector3D axis)
    {
        var segment = segments[at]!;
        if (segment.Length > 0)
        {
            return (segment.Start + distance * segment.Direction, AxisOf(segment, distance / segment.Length));
        }

        if (segment.TurnAngle > 0)
        {
            turnShare = NearestShare(segment, axis, turnShare);
        }

        return (segment.Start, AxisOf(segment, turnShare));
    }

    // z(u) turns about one axis, so axis·z(u) is A + B cos(uθ) + C sin(uθ), largest at uθ = atan2(C, B).
    private static double NearestShare(Segment segment, Vector3D axis, double from)
    {
        var about = 1 / segment.TurnAngle * segment.Turn;
        var z = AxisOf(segment, 0);
        var along = about.Dot(z) * about;
        var angle = Deterministic.Atan2(axis.Dot(about.Cross(z)), axis.Dot(z - along));
        return Math.Clamp(angle / segment.TurnAngle, from, 1);
    }

    private PathDeviation PassedBy(int from, int to, Vector3D begin, Vector3D end)
    {
        var worst = PathDeviation.None;
        for (var i = from; i < to; i++)
        {
            var corner = segments[i]!.End;
            var way = end - begin;
            var share = way.Norm > 0 ? Math.Clamp((corner - begin).Dot(way) / way.Dot(way), 0, 1) : 0;
            worst = worst.Worse(PathDeviation.Missing(begin + share * way, corner, AxisOf(segments[i]!, 1)));
        }

        return worst;
    }

    // The distance from a straight stretch to a point is largest at one of its ends.
    private PathDeviation Missed(Vector3D point, int lastWaypoint, double furthest)
    {
        var worst = PathDeviation.None;
        for (var i = at; i <= lastWaypoint && segments[i] is { } segment; i++)
        {
            var reached = i < lastWaypoint ? segment.Length : Math.Clamp(furthest - segment.StartTravel, 0, segment.Length);
            var share = segment.Length > 0 ? reached / segment.Length : 1;
            worst = worst.Worse(PathDeviation.Missing(point, segment.Start + reached * segment.Direction, AxisOf(segment, share)));
        }

        return worst;
    }

    private static Vector3D AxisOf(Segment segment, double share) => RotationMatrix.FromQuaternion(segment.OrientationAt(share)).AxisZ;
}
