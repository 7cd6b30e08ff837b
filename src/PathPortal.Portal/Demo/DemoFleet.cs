using PathPortal.Engine.Control;
using PathPortal.Formats.Documents;

namespace PathPortal.Portal.Demo;

/// <summary>The nine invented cells.</summary>
public static class DemoFleet
{
    public const string Bench = "Bench arm 900";
    public const string Floor = "Floor arm 1800";
    public const string Track = "Track arm 1800";

    public static IReadOnlyList<DemoCell> Cells { get; } =
    [
        new(DemoCompany.Tarnhus, "Seal 1", Bench, "Reference cell for sealing.", Cell(
            DemoCells.Pedestal(500), [DemoCells.Nozzle, DemoCells.Torch], [DemoCells.Frame("fixture A", 470, -170, 640)], DemoCells.Current())),
        new(DemoCompany.Tarnhus, "Seal 2", Bench, "As Seal 1, with an older controller that closes its loop on commanded joints.", Cell(
            DemoCells.Pedestal(500), [DemoCells.Nozzle, DemoCells.Torch], [DemoCells.Frame("fixture A", 470, -170, 640)], DemoCells.Older())),
        new(DemoCompany.Tarnhus, "Trim 1", Floor, "Deburring at a turning table that stands still while the arm works.", Cell(
            DemoCells.Pedestal(300), [DemoCells.Spindle], [DemoCells.Frame("table", 1150, 0, 750)], DemoCells.Current())),
        new(DemoCompany.Brevola, "Seal 3", Bench, "Mirror image of Seal 1.", Cell(
            DemoCells.Pedestal(500), [DemoCells.Nozzle], [DemoCells.Frame("fixture A", 480, -150, 640, 6)], DemoCells.Current())),
        new(DemoCompany.Brevola, "Weld 1", Bench, "Two brackets a cycle, torch straight on the flange.", Cell(
            DemoCells.Pedestal(500), [DemoCells.Torch], [DemoCells.Frame("bracket", 420, -30, 700)], DemoCells.Current() with { ToolAccelerationMmS2 = 100 })),
        new(DemoCompany.Brevola, "Finish 1", Track, "Large panels; the arm travels beside the table.", Cell(
            DemoCells.TrackEnd(-1200, -1000, 400), [DemoCells.Ball, DemoCells.Drill], [DemoCells.Frame("panel", 0, 100, 800)],
            DemoCells.Current() with { ToolAccelerationMmS2 = 1000 })),
        new(DemoCompany.Osmeda, "Seal 4", Bench, "The fixture stands close to the arm.", Cell(
            DemoCells.Pedestal(500), [DemoCells.Nozzle], [DemoCells.Frame("fixture A", 300, -170, 530)],
            DemoCells.Current() with { LimitReaction = LimitReaction.SlowPath })),
        new(DemoCompany.Osmeda, "Seal 5", Floor, "A larger arm than the job needs.", Cell(
            DemoCells.Pedestal(200), [DemoCells.Nozzle], [DemoCells.Frame("fixture A", 950, -170, 700)], DemoCells.Current())),
        new(DemoCompany.Osmeda, "Drill 1", Floor, "Drilling unit at 30° to the flange.", Cell(
            DemoCells.Pedestal(300), [DemoCells.Drill], [DemoCells.Frame("jig", 950, -150, 700)], DemoCells.Current())),
    ];

    private static CellSetupDocument Cell(
        MeasuredPoseDocument standing, List<MeasuredPoseDocument> tools, List<MeasuredPoseDocument> frames, ControllerDocument controller) => new()
        {
            Note = "Invented for the demo.",
            Base = standing,
            Tools = tools,
            Frames = frames,
            Controller = controller,
        };
}
