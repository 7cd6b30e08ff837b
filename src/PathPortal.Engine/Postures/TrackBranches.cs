using System.Globalization;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;

namespace PathPortal.Engine.Postures;

/// <summary>
/// An arm with closed form on a track: the track takes values on a grid over its limits, the arm's branches follow for each. Where a task asks for
/// staying near given joints, the track value among them comes first.
/// </summary>
internal sealed class TrackBranches(Joint track, SphericalWristBranches rider) : BranchSource
{
    private const int GridPoints = 17;
    private const double RangeWithoutLimits = 2; // m either way of zero

    public override bool IsClosedForm => false;

    public override List<Posture> Find(TaskKind task, RigidTransform toolInBase, ReadOnlySpan<double> near = default)
    {
        var low = track.Limits.Low?.Value ?? (track.Limits.High?.Value ?? RangeWithoutLimits) - 2 * RangeWithoutLimits;
        var high = track.Limits.High?.Value ?? low + 2 * RangeWithoutLimits;
        var values = Enumerable.Range(0, GridPoints).Select(i => low + (high - low) * i / (GridPoints - 1)).ToList();
        if (!near.IsEmpty)
        {
            values.Insert(0, near[0]);
        }

        var branches = new List<Posture>();
        foreach (var value in values)
        {
            var X_BR = track.PoseInPrevious * ArmPose.Motion(track, value);
            foreach (var branch in rider.Find(task, X_BR.Inverse() * toolInBase, near.IsEmpty ? near : near[1..]))
            {
                var place = value.ToString("0.000", CultureInfo.InvariantCulture);
                branches.Add(new(branch.Joints.Insert(0, value), $"track at {place} m, {branch.Description}"));
            }
        }

        return branches;
    }
}
