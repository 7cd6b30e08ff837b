using System.Collections.Immutable;

namespace PathPortal.Engine.Paths;

/// <summary>A path made ready to follow: geometry and time laws, the same for every posture of the arm. Immutable; safe between threads.</summary>
internal sealed class PathPlan
{
    /// <summary>Moves in order; none where there are problems.</summary>
    public required ImmutableArray<PlannedMove> Moves { get; init; }

    /// <summary>
    /// The programmed segments as written, by the index of the waypoint they end at; null at 0, and for joint moves.
    /// </summary>
    public required ImmutableArray<Segment?> Segments { get; init; }

    /// <summary>Where the path begins.</summary>
    public required PathPoint Begin { get; init; }

    /// <summary>Programmed travel of straight segments (m).</summary>
    public required double Length { get; init; }

    public required ImmutableArray<PlanProblem> Problems { get; init; }

    /// <summary>What a reader should know: points that repeat, corners where the tool stops anyway.</summary>
    public required ImmutableArray<string> Remarks { get; init; }
}
