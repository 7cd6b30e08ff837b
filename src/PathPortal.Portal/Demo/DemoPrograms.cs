using PathPortal.Portal.Domain.Programs;

namespace PathPortal.Portal.Demo;

/// <summary>The six invented path programs.</summary>
public static class DemoPrograms
{
    private const string Asta = "asta@demo.example";
    private const string Boro = "boro@demo.example";

    public static IReadOnlyList<DemoProgram> All { get; } =
    [
        new(DemoCompany.Tarnhus, Asta, "Door frame, left", "Door frame seal bead", "sealing", "Sealing",
            [
                On(DemoCompany.Tarnhus, "Seal 1", "nozzle", "fixture A"), On(DemoCompany.Tarnhus, "Seal 2", "nozzle", "fixture A"),
                On(DemoCompany.Brevola, "Seal 3", "nozzle", "fixture A"), On(DemoCompany.Osmeda, "Seal 4", "nozzle", "fixture A"),
                On(DemoCompany.Osmeda, "Seal 5", "nozzle", "fixture A"),
            ],
            [
                new("door-frame-seal-1.csv", "First release candidate, slow and upright."),
                new("door-frame-seal-2.csv", "Faster, and the nozzle leans over the hinge boss to keep the bead clear of it."),
            ]),
        new(DemoCompany.Tarnhus, Asta, "Pump housing", "Gasket groove trace", "sealing", "Sealing",
            [On(DemoCompany.Tarnhus, "Seal 1", "torch", "fixture A", 0), On(DemoCompany.Tarnhus, "Seal 2", "torch", "fixture A", 0)],
            [
                new("groove-trace-1.csv", "Slow enough for every controller."),
                new("groove-trace-2.csv", "Cycle time: more than twice as fast through the bends."),
            ]),
        new(DemoCompany.Tarnhus, Asta, "Pump housing", "Housing edge deburring", "deburring", "Edges",
            [On(DemoCompany.Tarnhus, "Trim 1", "spindle", "table")],
            [
                new("housing-deburr-1.csv", "The front part of the edge."),
                new("housing-deburr-2.csv", "Further round, so that the second clamping can go."),
            ]),
        new(DemoCompany.Brevola, Asta, "Seat bracket", "Bracket weld seam", "welding", "Welding",
            [On(DemoCompany.Brevola, "Weld 1", "torch", "bracket")],
            [
                new("bracket-weld-1.csv", "As drawn: the torch leans as the drawing says, and the wrist comes straight."),
                new("bracket-weld-2.csv", "The torch leans less, which keeps the wrist bent."),
            ]),
        new(DemoCompany.Osmeda, Boro, "Roof panel", "Panel drilling", "drilling", "Drilling",
            [On(DemoCompany.Osmeda, "Drill 1", "drill", "jig", 0), On(DemoCompany.Brevola, "Finish 1", "drill", "panel", 0)],
            [
                new("panel-drilling-1.csv", "Eight holes."),
                new("panel-drilling-2.csv", "Fifteen holes after the change of the hinge."),
            ]),
        new(DemoCompany.Brevola, Asta, "Roof panel", "Panel polishing", "polishing", "Polishing",
            [On(DemoCompany.Brevola, "Finish 1", "ball 30", "panel")],
            [
                new("panel-polish-1.csv", "Five lines."),
                new("panel-polish-2.csv", "Seven lines, faster."),
            ]),
    ];

    /// <summary>The bytes of an embedded path file.</summary>
    public static byte[] Read(string file)
    {
        using var stream = typeof(DemoPrograms).Assembly.GetManifestResourceStream("PathPortal.Portal.Demo.Paths." + file)
            ?? throw new ArgumentException($"There is no demo path called {file}.", nameof(file));
        using var memory = new MemoryStream();
        stream.CopyTo(memory);
        return memory.ToArray();
    }

    private static DemoProgram.Run On(string plant, string cell, string tool, string frame, double? freeTurn = null) =>
        new(plant, cell, new StartTerms(tool, frame, null, freeTurn));
}
