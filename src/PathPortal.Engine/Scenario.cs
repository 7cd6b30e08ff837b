using System.Collections.Immutable;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Control;
using PathPortal.Engine.Paths;
using PathPortal.Engine.Verdicts;

namespace PathPortal.Engine;

/// <summary>Everything one simulation depends on: the same scenario gives the same bits. Immutable.</summary>
public sealed record Scenario
{
    public required ArmModel Arm { get; init; }

    public required CellGeometry Cell { get; init; }

    public required ControllerSettings Controller { get; init; }

    public required ToolPath Path { get; init; }

    public required CriteriaSheet Criteria { get; init; }

    /// <summary>Joint values at the first waypoint (rad or m); null: every posture of the first waypoint is simulated and the best one chosen.</summary>
    public ImmutableArray<double>? Start { get; init; }

    /// <summary>Turn about the free tool axis at the first waypoint (rad), added to the programmed orientation; null: a 15° grid is tried where the first task leaves it free.</summary>
    public double? FreeTurn { get; init; }
}
