using System.Globalization;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;
using PathPortal.Engine.Postures;

namespace PathPortal.Engine.Control;

/// <summary>
/// Whether the programmed points of straight moves can be reached at all: where the arm was not at a waypoint when the reference passed it, inverse
/// kinematics decides.
/// </summary>
internal static class Reachability
{
    // Nearer than this (m, rad) the arm was there, give or take servo lag; its posture is the proof.
    private const double NearPoint = 1e-3;
    private const double NearTurn = 1e-2;

    // Waypoints looked at by inverse kinematics in one run: a slow loop trails at every one of them.
    private const int MostSolved = 500;

    /// <summary>The first waypoint found that no posture reaches, in a sentence; null where there is none among those the run came to.</summary>
    public static string? Missed(Scenario scenario, PathPlan plan, PostureFinder finder, RunSamples samples)
    {
        var X_BW = scenario.Cell.BaseInCell.Inverse() * scenario.Cell.WorkInCell;
        Span<double> seed = stackalloc double[samples.JointCount];
        var solved = 0;
        for (var k = 0; k < samples.Count && solved < MostSolved; k++)
        {
            // The last sample before the reference goes on to another waypoint.
            var waypoint = samples.Waypoint[k];
            var passes = k + 1 == samples.Count || samples.Waypoint[k + 1] != waypoint;
            if (!passes || plan.Segments[waypoint] is null || (samples.TrackingError[k] <= NearPoint && samples.TurnError[k] <= NearTurn))
            {
                continue;
            }

            if (!double.IsFinite(samples.TrackingError[k]))
            {
                // The run ended here, for that reason.
                return null;
            }

            for (var i = 0; i < seed.Length; i++)
            {
                seed[i] = samples.Joints[i][k];
            }

            solved++;
            var target = scenario.Path.Waypoints[waypoint];
            var X_BT = X_BW * new RigidTransform(RotationMatrix.FromQuaternion(target.Orientation), target.Position);
            if (!IsReached(finder, X_BT, seed, target.Task))
            {
                return string.Create(CultureInfo.InvariantCulture, $"Waypoint {waypoint + 1} is out of the arm's reach.");
            }
        }

        return null;
    }

    private static bool IsReached(PostureFinder finder, RigidTransform X_BT, ReadOnlySpan<double> seed, TaskKind task)
    {
        if (finder.Continue(X_BT, seed, task) is not null)
        {
            return true;
        }

        var postures = finder.All(X_BT, task);
        return !postures.Inside.IsEmpty || !postures.Outside.IsEmpty;
    }
}
