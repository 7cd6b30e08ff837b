using System.Collections.Immutable;

namespace PathPortal.Engine.Paths;

/// <summary>The content of one revision of a path program: at least two waypoints in the work frame, in order. Immutable.</summary>
public sealed record ToolPath(ImmutableArray<Waypoint> Waypoints);
