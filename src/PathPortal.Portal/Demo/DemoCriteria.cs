using PathPortal.Formats.Documents;

namespace PathPortal.Portal.Demo;

/// <summary>The criteria sheets of the demo, one per kind of process. Tolerances are invented.</summary>
public static class DemoCriteria
{
    /// <summary>Every sheet with its name.</summary>
    public static IReadOnlyList<(string Name, CriteriaDocument Sheet)> All { get; } =
    [
        ("Sealing", Sealing()), ("Welding", Welding()), ("Edges", Edges()), ("Drilling", Drilling()), ("Polishing", Polishing()),
    ];

    /// <summary>A bead laid beside an edge: stand-off decides how thick it is.</summary>
    private static CriteriaDocument Sealing() => new()
    {
        Note = "Invented for the demo.",
        AcrossToleranceMm = 0.8,
        AcrossAllowanceMm = 0.15,
        StandOffToleranceMm = 0.8,
        StandOffAllowanceMm = 0.15,
        AxisToleranceDeg = 3,
        AxisAllowanceDeg = 0.2,
        RequiredSigmaMin = 0.04,
    };

    /// <summary>A seam: the torch may lean, the arc may not leave the joint.</summary>
    private static CriteriaDocument Welding() => new()
    {
        Note = "Invented for the demo.",
        AcrossToleranceMm = 0.5,
        AcrossAllowanceMm = 0.1,
        StandOffToleranceMm = 1,
        StandOffAllowanceMm = 0.1,
        AxisToleranceDeg = 5,
        AxisAllowanceDeg = 0.2,
        RequiredSigmaMin = 0.04,
        ToolSpeedTolerancePercent = 20,
    };

    /// <summary>A spindle along an edge; its hose needs room at the wrist.</summary>
    private static CriteriaDocument Edges() => new()
    {
        Note = "Invented for the demo.",
        AcrossToleranceMm = 0.4,
        AcrossAllowanceMm = 0.1,
        StandOffToleranceMm = 1,
        StandOffAllowanceMm = 0.1,
        AxisToleranceDeg = 5,
        AxisAllowanceDeg = 0.2,
        RevoluteClearanceDeg = 15,
        RequiredSigmaMin = 0.03,
    };

    /// <summary>Holes: the turn about the drill is free, the axis is not.</summary>
    private static CriteriaDocument Drilling() => new()
    {
        Note = "Invented for the demo.",
        AcrossToleranceMm = 0.2,
        AcrossAllowanceMm = 0.05,
        AxisToleranceDeg = 0.5,
        AxisAllowanceDeg = 0.05,
        RequiredSigmaMin = 0.03,
    };

    /// <summary>A ball-shaped tool: only the contact point counts.</summary>
    private static CriteriaDocument Polishing() => new()
    {
        Note = "Invented for the demo.",
        AcrossToleranceMm = 1.5,
        AcrossAllowanceMm = 0.2,
        StandOffToleranceMm = 1,
        StandOffAllowanceMm = 0.2,
        RequiredSigmaMin = 0.03,
    };
}
