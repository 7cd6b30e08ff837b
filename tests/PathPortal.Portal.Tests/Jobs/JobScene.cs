using System.Globalization;
using System.Text;
using Microsoft.EntityFrameworkCore;
using Microsoft.Extensions.DependencyInjection;
using Npgsql;
using PathPortal.Engine.Arms;
using PathPortal.Formats.Documents;
using PathPortal.Formats.Paths;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.Fleet;
using PathPortal.Portal.Domain.People;
using PathPortal.Portal.Domain.Programs;
using PathPortal.Portal.Domain.Runs;
using PathPortal.Portal.Jobs;
using PathPortal.Portal.Simulation;
using PathPortal.TestSupport;

namespace PathPortal.Portal.Tests.Jobs;

/// <summary>A database with one plant, two cells and a program on both, all invented; uploads as the web does, under the web's role.</summary>
internal sealed class JobScene : IAsyncDisposable
{
    public static readonly Actor Actor = Actor.Process("test");

    private readonly ServiceProvider _web;
    private readonly Account _author;
    private readonly Plant _plant;
    private readonly CriteriaSheetVersion _criteria;
    private readonly ArmModelVersion _arm;
    private readonly CellSetup[] _setups;
    private readonly Assignment[] _assignments;
    private readonly Guid _program;

    private JobScene(TestDatabase? database, string webConnection)
    {
        Database = database;
        _web = new ServiceCollection().AddLogging().AddPortalData(webConnection).AddRunQueue().BuildServiceProvider();
        var at = TimeProvider.System.GetUtcNow();
        _author = new("author@plant.example", "Invented author", at);
        _plant = new("Invented plant", "Etc/UTC", 1, [Role.Lead], at);
        Part part = new("Invented cover", "", at);
        ArmModelRecord arm = new("Invented arm", at);
        _arm = arm.AddVersion(StoredDocument.Of(ArmJson()), "", _author.Id, at);
        CriteriaSheetRecord sheet = new("Invented sheet", at);
        _criteria = sheet.AddVersion(StoredDocument.Of(CriteriaJson()), "", _author.Id, at);
        Cell[] cells = [new(_plant.Id, "Cell A", at), new(_plant.Id, "Cell B", at)];
        _setups = [.. cells.Select((c, i) => c.AddSetup(_arm.Id, StoredDocument.Of(SetupJson(i)), "", _author.Id, at))];
        PathProgram program = new(_plant.Id, part.Id, "Invented bead", "sealing", sheet.Id, _author.Id, at);
        _program = program.Id;
        double[]? start = null;
        _assignments = [.. cells.Select(c => new Assignment(program.Id, c.Id, new("nozzle", "fixture", start, null), _author.Id, at))];
        Rows = [_author, _plant, part, arm, _arm, sheet, _criteria, .. cells, .. _setups, program, .. _assignments];
    }

    public TestDatabase? Database { get; }

    public PortalDb Db => _web.GetRequiredService<PortalDb>();

    public RunQueue Queue => _web.GetRequiredService<RunQueue>();

    public Guid PlantId => _plant.Id;

    private object[] Rows { get; }

    public static async Task<JobScene> CreateAsync()
    {
        var database = await TestDatabase.CreateAsync();
        return await CreateAsync(database, database.Web);
    }

    /// <summary>What one cell's scenario is built from, apart from the path.</summary>
    public static ScenarioInputs Inputs(Func<StartTerms, StartTerms>? terms = null)
    {
        StartTerms usual = new("nozzle", "fixture", [0, -1, 1, 0, 1, 0], null);
        return new(ArmJson(), SetupJson(0), CriteriaJson(), terms is null ? usual : terms(usual));
    }

    /// <summary>In a migrated database that somebody else disposes.</summary>
    public static Task<JobScene> CreateAsync(string webConnection) => CreateAsync(null, webConnection);

    /// <summary>A straight bead of so many points, 1 mm apart; every number gives another path.</summary>
    public static string Path(int number, int points = 3, double speedMmS = 100)
    {
        var text = new StringBuilder("x_mm,y_mm,z_mm,fixed_xyz_1_deg,fixed_xyz_2_deg,fixed_xyz_3_deg,motion,speed_mm_s,process\n");
        for (var i = 0; i < points; i++)
        {
            // To and fro, so that a long path stays within reach.
            var x = Math.Abs((i % 200) - 100);
            text.Append(CultureInfo.InvariantCulture, $"{x},{i % 2},{number / 1000.0},180,0,0,straight,{speedMmS},on\n");
        }
        return text.ToString();
    }

    /// <summary>Stores a revision and enqueues its runs on both cells in one transaction, as an upload does.</summary>
    public async Task<List<Guid>> UploadAsync(string path, int cells = 2)
    {
        var bytes = Encoding.UTF8.GetBytes(path);
        var done = await Db.ActAsync<List<Guid>>(Actor, async session =>
        {
            var runs = await AddAsync(session, bytes, cells);
            Queue.Enqueue(session, runs, RunPriority.Interactive);
            return runs.Select(r => r.Id).ToList();
        });
        return done.Value;
    }

    /// <summary>Adds revision, requests and runs to the session, and gives back those that are still to be computed.</summary>
    public async Task<List<Run>> AddAsync(PortalSession session, byte[] source, int cells = 2, string? digest = null)
    {
        var program = await session.Db.Programs.AsTracking().SingleAsync(p => p.Id == _program);
        var read = PathCsv.Read(source).Value!;
        var revision = program.AddRevision(
            new("bead.csv", "csv", source), new(read.Path.Waypoints.Length, 1, null, [0, 0, 0], [1, 1, 1], []), "", _author.Id, session.Now);
        session.Db.Revisions.Add(revision);
        List<Run> queued = [];
        for (var i = 0; i < cells; i++)
        {
            var built = ScenarioBuilder.Build(read.Path, new(_arm.Json, _setups[i].Json, _criteria.Json, _assignments[i].Terms));
            Assert.True(built.Ok, built.ProblemText);
            var wanted = digest ?? built.Digest;
            var run = await session.Db.Runs.AsTracking().SingleOrDefaultAsync(r => r.PlantId == _plant.Id && r.Digest == wanted);
            if (run is null)
            {
                run = new Run(_plant.Id, wanted, Engine.NumericsVersion.Current, session.Now);
                session.Db.Runs.Add(run);
                queued.Add(run);
            }
            session.Db.RunRequests.Add(new(run, null, revision.Id, _assignments[i].Id, _setups[i].Id, _criteria.Id, _author.Id, session.Now));
        }
        return queued;
    }

    public Task<Run> RunAsync(Guid id) => Db.ReadAsync(Actor, s => s.Db.Runs.SingleAsync(r => r.Id == id));

    public Task<List<Run>> RunsAsync() => Db.ReadAsync(Actor, s => s.Db.Runs.OrderBy(r => r.QueuedAt).ToListAsync());

    /// <summary>The worker's side in this process, without a started scheduler.</summary>
    public ServiceProvider WorkerServices() =>
        new ServiceCollection().AddLogging().AddPortalData(Database!.Worker).AddRunWorker(new()).BuildServiceProvider();

    public async Task<object?> SqlAsync(string sql, params object[] values)
    {
        await using var connection = new NpgsqlConnection(Database!.Superuser);
        await connection.OpenAsync();
        await using var command = new NpgsqlCommand(sql, connection);
        foreach (var value in values)
            command.Parameters.Add(new() { Value = value });
        return await command.ExecuteScalarAsync();
    }

    public async ValueTask DisposeAsync()
    {
        await _web.DisposeAsync();
        if (Database is not null)
            await Database.DisposeAsync();
    }

    private static async Task<JobScene> CreateAsync(TestDatabase? database, string webConnection)
    {
        var scene = new JobScene(database, webConnection);
        await using var session = await scene.Db.OpenAsync(Actor);
        session.Db.AddRange(scene.Rows);
        await session.CommitAsync();
        return scene;
    }

    // Invented six-joint arm with a spherical wrist.
    internal static string ArmJson()
    {
        double[] a = [60, 500, 40, 0, 0, 0];
        double[] alpha = [90, 0, 90, -90, 90, 0];
        double[] d = [420, 0, 0, 460, 0, 90];
        return new ArmDocument
        {
            Name = "Invented arm",
            Kinematics = ArmKinematics.DhStandard,
            Joints = [.. Enumerable.Range(0, 6).Select(i => new JointDocument
            {
                Name = "J" + (i + 1).ToString(CultureInfo.InvariantCulture),
                Kind = JointKind.Revolute,
                AMm = a[i],
                AlphaDeg = alpha[i],
                DMm = d[i],
                Limits = new()
                {
                    Low = new() { Value = -170, Source = "invented" },
                    High = new() { Value = 170, Source = "invented" },
                    Speed = new() { Value = 220, Source = "invented" },
                    Acceleration = new() { Value = 1500, Source = "invented" },
                },
            })],
        }.ToJson();
    }

    private static string CriteriaJson() => new CriteriaDocument { AcrossToleranceMm = 1 }.ToJson();

    internal static string SetupJson(int cell) => new CellSetupDocument
    {
        Tools = [new() { Name = "nozzle", Pose = new() { ZMm = 120 } }],
        Frames = [new() { Name = "fixture", Pose = new() { XMm = 600 + cell, YMm = -50, ZMm = 200 } }],
    }.ToJson();
}
