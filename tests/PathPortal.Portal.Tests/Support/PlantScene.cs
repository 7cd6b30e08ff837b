using System.Text;
using Microsoft.AspNetCore.Identity;
using Microsoft.EntityFrameworkCore;
using Microsoft.Extensions.DependencyInjection;
using Npgsql;
using PathPortal.Engine.Verdicts;
using PathPortal.Formats.Documents;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.Fleet;
using PathPortal.Portal.Domain.People;
using PathPortal.Portal.Domain.Programs;
using PathPortal.Portal.Domain.Reviews;
using PathPortal.Portal.Handling;
using PathPortal.Portal.Handling.Programs;
using PathPortal.Portal.Handling.Reviews;
using PathPortal.Portal.Jobs;
using PathPortal.Portal.Tests.Jobs;
using PathPortal.TestSupport;

namespace PathPortal.Portal.Tests.Support;

/// <summary>
/// A database with one plant, a cell and a program on it, somebody in every role, and strangers of another plant; all invented. Everything
/// goes through the handlers under the web's role, as in the real process.
/// </summary>
internal sealed class PlantScene : IAsyncDisposable
{
    private readonly ServiceProvider _services;

    private PlantScene(TestDatabase database, int approvalsRequired)
    {
        Database = database;
        var services = new ServiceCollection().AddLogging().AddPortalData(database.Web).AddRunQueue().AddPortalHandlers();
        services.AddSingleton<IPasswordHasher<Account>>(PortalData.CreateHasher());
        _services = services.BuildServiceProvider();
        var at = TimeProvider.System.GetUtcNow();
        Account Person(string name) => new(name + "@plant.example", "Invented " + name, at)
        {
            NormalizedUserName = (name + "@plant.example").ToUpperInvariant(),
            NormalizedEmail = (name + "@plant.example").ToUpperInvariant(),
        };
        Author = Person("author");
        SecondAuthor = Person("second-author");
        CellOwner = Person("cell-owner");
        Lead = Person("lead");
        SecondLead = Person("second-lead");
        Viewer = Person("viewer");
        Administrator = Person("administrator");
        Company = Person("company");
        Company.AdministersCompany = true;
        Stranger = Person("stranger");
        Nobody = Person("nobody");
        Plant = new("Invented plant", "Europe/Prague", approvalsRequired, [Role.CellOwner, Role.Lead], at);
        OtherPlant = new("Another invented plant", "Etc/UTC", 1, [Role.Lead], at);
        Part = new("Invented cover", "", at);
        ArmModelRecord arm = new("Invented arm", at);
        ArmVersion = arm.AddVersion(StoredDocument.Of(JobScene.ArmJson()), "", CellOwner.Id, at);
        Sheet = new("Invented sheet", at);
        var criteria = Sheet.AddVersion(StoredDocument.Of(new CriteriaDocument { AcrossToleranceMm = 1 }.ToJson()), "", Lead.Id, at);
        Cell = new(Plant.Id, "Cell A", at);
        var setup = Cell.AddSetup(ArmVersion.Id, StoredDocument.Of(JobScene.SetupJson(0)), "", CellOwner.Id, at);
        Program = new(Plant.Id, Part.Id, "Invented bead", "sealing", Sheet.Id, Author.Id, at);
        Assignment = new(Program.Id, Cell.Id, Terms, Author.Id, at);
        Account[] people = [Author, SecondAuthor, CellOwner, Lead, SecondLead, Viewer, Administrator, Company, Stranger, Nobody];
        PlantRole[] roles =
        [
            new(Author.Id, Plant.Id, Role.Author, at), new(SecondAuthor.Id, Plant.Id, Role.Author, at), new(CellOwner.Id, Plant.Id, Role.CellOwner, at),
            new(Lead.Id, Plant.Id, Role.Lead, at), new(SecondLead.Id, Plant.Id, Role.Lead, at), new(Viewer.Id, Plant.Id, Role.Viewer, at),
            new(Administrator.Id, Plant.Id, Role.Administrator, at),
            .. Enum.GetValues<Role>().Select(role => new PlantRole(Stranger.Id, OtherPlant.Id, role, at)),
        ];
        Rows = [.. people, Plant, OtherPlant, .. roles, Part, arm, ArmVersion, Sheet, criteria, Cell, setup, Program, Assignment];
    }

    public TestDatabase Database { get; }

    public PortalDb Db => Get<PortalDb>();

    public Account Author { get; }

    public Account SecondAuthor { get; }

    public Account CellOwner { get; }

    public Account Lead { get; }

    public Account SecondLead { get; }

    public Account Viewer { get; }

    public Account Administrator { get; }

    public Account Company { get; }

    /// <summary>Has every role, in the other plant.</summary>
    public Account Stranger { get; }

    /// <summary>Has no role anywhere.</summary>
    public Account Nobody { get; }

    public Plant Plant { get; }

    public Plant OtherPlant { get; }

    public Part Part { get; }

    public ArmModelVersion ArmVersion { get; }

    public CriteriaSheetRecord Sheet { get; }

    public Cell Cell { get; }

    public PathProgram Program { get; }

    public Assignment Assignment { get; }

    public static StartTerms Terms { get; } = new("nozzle", "fixture", [0, -1, 1, 0, 1, 0], null);

    private object[] Rows { get; }

    public static async Task<PlantScene> CreateAsync(int approvalsRequired = 1)
    {
        var scene = new PlantScene(await TestDatabase.CreateAsync(), approvalsRequired);
        await using var session = await scene.Db.OpenAsync(Actor.Process("test"));
        session.Db.AddRange(scene.Rows);
        await session.CommitAsync();
        return scene;
    }

    public T Get<T>()
        where T : notnull => _services.GetRequiredService<T>();

    public static Reauthentication Signed(Account account) => new(account.Id, "password", TimeProvider.System.GetUtcNow().AddMilliseconds(-1));

    public static byte[] Path(int number) => Encoding.UTF8.GetBytes(JobScene.Path(number));

    public async Task<UploadedRevision> UploadAsync(int number, Account? by = null)
    {
        var result = await Get<UploadRevision>().HandleAsync(Actor.Of((by ?? Author).Id), Program.Id, "bead.csv", Path(number), "");
        Assert.True(result.Succeeded, result.Refusal?.Message);
        return result.Revision;
    }

    /// <summary>What a worker would write, without computing it.</summary>
    public async Task FinishRunsAsync(Verdict verdict = Verdict.Pass)
    {
        await using var session = await Db.OpenAsync(Actor.Process("test"));
        foreach (var run in await session.Db.Runs.Where(r => r.State == Domain.Runs.RunState.Queued).ToListAsync())
        {
            run.Start("test", session.Now);
            run.Complete(new(verdict, 0.5, Criterion.JointSpeed, 1, "{}", null), session.Now);
        }
        await session.CommitAsync();
    }

    /// <summary>An uploaded, simulated and submitted revision; the review's id.</summary>
    public async Task<Guid> SubmitAsync(int number, Account? uploader = null, Account? submitter = null, Verdict verdict = Verdict.Pass)
    {
        var revision = await UploadAsync(number, uploader);
        await FinishRunsAsync(verdict);
        var review = await Get<SubmitForReview>().HandleAsync(Actor.Of((submitter ?? Author).Id), revision.Id, Assignment.Id, "ready");
        Assert.True(review.Succeeded, review.Refusal?.Message);
        return review.Value;
    }

    public Task<Review> ReviewAsync(Guid id) => Db.ReadAsync(
        Actor.Process("test"), s => s.Db.Reviews.Include(r => r.Decisions).Include(r => r.Transitions).AsSplitQuery().SingleAsync(r => r.Id == id));

    public async Task<Evidence> EvidenceAsync(Guid reviewId)
    {
        var review = await ReviewAsync(reviewId);
        var evidence = await Db.ReadAsync(Actor.Process("test"), s => EvidenceReader.ReadAsync(s.Db, review.RevisionId, review.AssignmentId));
        return evidence.Digests!;
    }

    public async Task<Outcome<ReviewState>> DecideAsync(Guid reviewId, Account by, DecisionKind kind = DecisionKind.Approve, Evidence? shown = null) =>
        await Get<DecideReview>().HandleAsync(
            Actor.Of(by.Id), new(reviewId, kind, shown ?? await EvidenceAsync(reviewId), "looked at it"), Signed(by));

    /// <summary>A statement as somebody with no privilege in the way, past everything the code checks.</summary>
    public Task<object?> SqlAsync(string sql, params object[] values) => SqlAsync(Database.Superuser, sql, values);

    public static async Task<object?> SqlAsync(string connectionString, string sql, params object[] values)
    {
        await using var connection = new NpgsqlConnection(connectionString + ";Pooling=false");
        await connection.OpenAsync();
        await using var command = new NpgsqlCommand(sql, connection);
        foreach (var value in values)
            command.Parameters.Add(new() { Value = value });
        return await command.ExecuteScalarAsync();
    }

    public async ValueTask DisposeAsync()
    {
        await _services.DisposeAsync();
        await Database.DisposeAsync();
    }
}
