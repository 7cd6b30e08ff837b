using System.Collections.Immutable;
using PathPortal.Engine.Arms;

namespace PathPortal.Engine.Paths;

/// <summary>The content of one revision of a path program: at least two waypoints in the work frame, in order. Immutable.</summary>
public sealed record ToolPath(ImmutableArray<Waypoint> Waypoints)
{
    /// <summary>Kinds of the joints that posture values stand for, where the source says so by their units; empty where it does not.</summary>
    public ImmutableArray<JointKind> PostureKinds { get; init; } = [];
}
