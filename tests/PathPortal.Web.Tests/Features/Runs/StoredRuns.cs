using System.Text;
using PathPortal.Engine;
using PathPortal.Formats.Documents;
using PathPortal.Formats.Paths;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.Fleet;
using PathPortal.Portal.Domain.People;
using PathPortal.Portal.Domain.Programs;
using PathPortal.Portal.Domain.Runs;
using PathPortal.Portal.Simulation;
using PathPortal.TestSupport.Runs;
using PathPortal.Web.Tests.Support;

namespace PathPortal.Web.Tests.Features.Runs;

/// <summary>A program on one cell of one plant, and runs of it in any state, written straight into the tables.</summary>
internal sealed class StoredRuns
{
    public const string Reader = "reader@runs.example";
    public const string Stranger = "stranger@runs.example";
    public const string Lead = "lead@runs.example";

    private static readonly DateTimeOffset At = new(2026, 3, 2, 9, 0, 0, TimeSpan.Zero);

    private static readonly byte[] Path = Encoding.UTF8.GetBytes(PathExample.Text);
    private static readonly StartTerms Terms = new("nozzle", "fixture", null, null);
    private static readonly string ArmJson = Arm().ToJson();
    private static readonly string CriteriaJson = new CriteriaDocument { AcrossToleranceMm = 1.8 }.ToJson();
    private static readonly string SetupJson = new CellSetupDocument
    {
        Note = "Invented.",
        Tools = [new() { Name = "nozzle", Pose = new() { ZMm = 120 } }],
        Frames = [new() { Name = "fixture", Pose = new() { XMm = 420, YMm = -60, ZMm = 250 } }],
    }.ToJson();

    private readonly People _people;
    private readonly Plant _plant;
    private readonly Revision _revision;
    private readonly Assignment _assignment;
    private readonly CellSetup _setup;
    private readonly CriteriaSheetVersion _sheet;
    private readonly Account _reader;
    private int _requests;

    private StoredRuns(People people, Plant plant, Account reader, Revision revision, Assignment assignment, CellSetup setup, CriteriaSheetVersion sheet) =>
        (_people, _plant, _reader, _revision, _assignment, _setup, _sheet) = (people, plant, reader, revision, assignment, setup, sheet);

    public static async Task<StoredRuns> MakeAsync(People people)
    {
        var plant = await people.PlantAsync("Run works");
        var elsewhere = await people.PlantAsync("Works elsewhere");
        var reader = await people.AccountAsync(Reader, "Rita Reader", (plant, Role.Viewer));
        await people.AccountAsync(Stranger, "Sam Stranger", (elsewhere, Role.Lead));
        var lead = await people.AccountAsync(Lead, "Lea Lead", (plant, Role.Lead));

        var arm = new ArmModelRecord("Heron 12 (invented)", At);
        var armVersion = arm.AddVersion(StoredDocument.Of(ArmJson), "", lead.Id, At);
        var sheet = new CriteriaSheetRecord("Sealing (invented)", At);
        var sheetVersion = sheet.AddVersion(StoredDocument.Of(CriteriaJson), "", lead.Id, At);
        var cell = new Cell(plant.Id, "North <3>", At);
        var setup = cell.AddSetup(armVersion.Id, StoredDocument.Of(SetupJson), "", lead.Id, At);
        var part = new Part("Hatch", "", At);
        await people.SaveAsync(arm, armVersion, sheet, sheetVersion, cell, setup, part);
        var program = new PathProgram(plant.Id, part.Id, "Hatch seam", "sealing", sheet.Id, lead.Id, At);
        var revision = program.AddRevision(
            new("hatch.csv", "csv", Path), new(13, 7.214, 59.6, [0, 0, 0], [1, 1, 1], []), "", lead.Id, At);
        var assignment = new Assignment(program.Id, cell.Id, Terms, lead.Id, At);
        await people.SaveAsync(program, revision, assignment);
        return new(people, plant, reader, revision, assignment, setup, sheetVersion);
    }

    public Task<Run> DoneAsync(InventedRun invented) => AddAsync(Done(new(invented.Summary, invented.Bins, null)));

    /// <summary>A run of the stored inputs as a worker would have left it, and what the engine makes of them with samples.</summary>
    public async Task<(Run Run, RunResult Result)> ComputedAsync()
    {
        var built = ScenarioBuilder.Build("csv", Path, new(ArmJson, SetupJson, CriteriaJson, Terms));
        Assert.True(built.Ok, built.ProblemText);
        var result = Simulator.Run(built.Scenario, keepSamples: true);
        return (await AddAsync(Done(result), built.Digest), result);
    }

    public Task<Run> RunningAsync(double progress) => AddAsync(run =>
    {
        run.Start("worker-1", At);
        run.Advance(progress);
    });

    public Task<Run> FailedAsync(string error) => AddAsync(run =>
    {
        run.Start("worker-1", At);
        run.Fail(error, At.AddSeconds(1));
    });

    private static Action<Run> Done(RunResult result) => run =>
    {
        run.Start("worker-1", At);
        run.Complete(RunConclusions.Of(result), At.AddSeconds(2));
    };

    private async Task<Run> AddAsync(Action<Run> become, string? digest = null)
    {
        var run = new Run(_plant.Id, digest ?? Sha256Text.Of(Guid.NewGuid().ToString()), NumericsVersion.Current, At);
        become(run);
        await _people.SaveAsync(
            run, new RunRequest(run, null, _revision.Id, _assignment.Id, _setup.Id, _sheet.Id, _reader.Id, At.AddMinutes(++_requests)));
        return run;
    }

    private static ArmDocument Arm() => new()
    {
        Name = "Heron 12",
        Note = "Invented.",
        Kinematics = ArmKinematics.DhStandard,
        Joints = [.. Enumerable.Range(0, 6).Select(i => new JointDocument
        {
            Name = $"J{i + 1}",
            AMm = new double[] { 50, 420, 30, 0, 0, 0 }[i],
            AlphaDeg = new double[] { 90, 0, 90, -90, 90, 0 }[i],
            DMm = new double[] { 400, 0, 0, 380, 0, 90 }[i],
            Limits = new()
            {
                Low = new() { Value = -170, Source = "invented" },
                High = new() { Value = 170, Source = "invented" },
                Speed = new() { Value = 220, Source = "invented" },
            },
        })],
    };
}
