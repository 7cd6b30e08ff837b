namespace PathPortal.Engine.Paths;

/// <summary>What the reference does between two stops.</summary>
internal abstract record PlannedMove;

/// <summary>Tool-space motion.</summary>
internal sealed record ChainMove(ToolChain Chain) : PlannedMove;

/// <summary>A pause at a place for a time (s).</summary>
internal sealed record DwellMove(PathPoint Place, double Duration) : PlannedMove;

/// <summary>A joint-interpolated move to a waypoint; how long it takes depends on the posture it starts from.</summary>
/// <param name="Waypoint">Index of the waypoint it ends at.</param>
/// <param name="End">The place it ends at.</param>
internal sealed record JointMove(int Waypoint, PathPoint End) : PlannedMove;
