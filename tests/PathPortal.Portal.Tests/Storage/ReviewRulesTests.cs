using Npgsql;
using PathPortal.Portal.Domain.Reviews;
using PathPortal.Portal.Tests.Support;

namespace PathPortal.Portal.Tests.Storage;

/// <summary>Order and four eyes as the database holds them, against statements that go past the code.</summary>
public sealed class ReviewRulesTests
{
    private const string InsertDecision =
        """
        INSERT INTO decisions (id, review_id, round, kind, decided_by, decided_at, uploaded_by, submitted_by, run_request_id, revision_sha256,
            setup_sha256, criteria_sha256, run_digest, meaning, reason)
        SELECT gen_random_uuid(), r.id, r.round, 'Approve', $2, now(), $3, $4, q.id, v.sha256, repeat('a', 64), repeat('b', 64), repeat('c', 64), '', ''
        FROM reviews r JOIN revisions v ON v.id = r.revision_id JOIN run_requests q ON q.revision_id = v.id WHERE r.id = $1
        """;

    [Fact]
    public async Task MoveTable_OfDatabaseAndCode_IsTheSame()
    {
        var database = await SharedDatabase.GetAsync();
        foreach (var from in Enum.GetValues<ReviewState>())
        {
            foreach (var to in Enum.GetValues<ReviewState>())
            {
                var inDatabase = await PlantScene.SqlAsync(database.Web, "SELECT review_may_move($1, $2)", from.ToString(), to.ToString());
                Assert.True((bool)inDatabase! == ReviewMoves.MayFollow(from, to), $"{from} to {to}");
            }
        }
    }

    [Fact]
    public async Task Decision_ByUploaderOrSubmitter_IsRefused()
    {
        await using var scene = await PlantScene.CreateAsync();
        var review = await scene.SubmitAsync(1, uploader: scene.Author, submitter: scene.SecondAuthor);
        foreach (var by in new[] { scene.Author.Id, scene.SecondAuthor.Id })
            await RefusedAsync(scene, "23514", InsertDecision, review, by, scene.Author.Id, scene.SecondAuthor.Id);
    }

    [Fact]
    public async Task Decision_NamingTheWrongUploaderOrSubmitter_IsRefused()
    {
        await using var scene = await PlantScene.CreateAsync();
        var review = await scene.SubmitAsync(1);
        var (author, lead, other) = (scene.Author.Id, scene.Lead.Id, scene.Viewer.Id);
        await RefusedAsync(scene, "PP001", InsertDecision, review, author, other, other);
        await RefusedAsync(scene, "PP001", InsertDecision, review, lead, other, author);
        await RefusedAsync(scene, "PP001", InsertDecision, review, lead, author, other);
    }

    [Fact]
    public async Task Decision_ThatTheReviewDoesNotCount_IsRefused()
    {
        await using var scene = await PlantScene.CreateAsync(approvalsRequired: 2);
        var review = await scene.SubmitAsync(1);
        await RefusedAsync(scene, "PP002", InsertDecision, review, scene.Lead.Id, scene.Author.Id, scene.Author.Id);
    }

    [Fact]
    public async Task Decision_SecondOfTheSamePersonInARound_IsRefused()
    {
        await using var scene = await PlantScene.CreateAsync(approvalsRequired: 2);
        var review = await scene.SubmitAsync(1);
        Assert.True((await scene.DecideAsync(review, scene.Lead)).Succeeded);
        await RefusedAsync(scene, "23505", InsertDecision, review, scene.Lead.Id, scene.Author.Id, scene.Author.Id);
    }

    [Fact]
    public async Task Decision_OnADecidedReview_IsRefused()
    {
        await using var scene = await PlantScene.CreateAsync();
        var review = await scene.SubmitAsync(1);
        Assert.True((await scene.DecideAsync(review, scene.Lead, DecisionKind.Reject)).Succeeded);
        await RefusedAsync(scene, "PP002", InsertDecision, review, scene.CellOwner.Id, scene.Author.Id, scene.Author.Id);
    }

    [Theory]
    [InlineData("UPDATE reviews SET state = 'Approved', approvals_given = 1 WHERE id = $1", "PP002")]
    [InlineData("UPDATE reviews SET state = 'Approved' WHERE id = $1", "23514")]
    [InlineData("UPDATE reviews SET state = 'Released', approvals_given = 1 WHERE id = $1", "PP002")]
    [InlineData("UPDATE reviews SET state = 'Withdrawn' WHERE id = $1", "PP002")]
    [InlineData("UPDATE reviews SET approvals_given = 1 WHERE id = $1", "PP002")]
    [InlineData("UPDATE reviews SET approvals_required = 0 WHERE id = $1", "PP002")]
    [InlineData("UPDATE reviews SET round = 2 WHERE id = $1", "PP002")]
    [InlineData("UPDATE reviews SET submitted_by = (SELECT id FROM accounts WHERE email = 'viewer@plant.example') WHERE id = $1", "PP002")]
    [InlineData("UPDATE reviews SET plant_id = (SELECT id FROM plants WHERE name = 'Another invented plant') WHERE id = $1", "PP003")]
    [InlineData("DELETE FROM reviews WHERE id = $1", "PP003")]
    public async Task Review_ChangedPastTheCode_IsRefused(string sql, string state)
    {
        await using var scene = await PlantScene.CreateAsync();
        var review = await scene.SubmitAsync(1);
        await RefusedAsync(scene, state, sql, review);
    }

    [Fact]
    public async Task Run_ResultChangedPastTheCode_IsRefused()
    {
        await using var scene = await PlantScene.CreateAsync();
        await scene.SubmitAsync(1);
        await RefusedAsync(scene, "PP003", "UPDATE runs SET verdict = 'Fail'");
        await RefusedAsync(scene, "PP003", "DELETE FROM runs");
    }

    private static async Task RefusedAsync(PlantScene scene, string state, string sql, params object[] values)
    {
        var refused = await Assert.ThrowsAsync<PostgresException>(() => scene.SqlAsync(sql, values));
        Assert.True(refused.SqlState == state, $"{refused.SqlState} {refused.MessageText}, not {state}: {sql}");
    }
}
