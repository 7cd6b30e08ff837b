using System.Globalization;
using Microsoft.EntityFrameworkCore;
using Npgsql;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain.History;
using PathPortal.Portal.Handling.History;
using PathPortal.Portal.Tests.Support;
using PathPortal.TestSupport;

namespace PathPortal.Portal.Tests.Storage;

/// <summary>The chain as it is stored: appended by the web's role, altered by an administrator of the database.</summary>
public sealed class HistoryTests
{
    private static readonly Actor Actor = Actor.Process("test");

    public static TheoryData<string, long> Tampering() => new()
    {
        { "UPDATE history SET content = convert_to('{}', 'UTF8') WHERE sequence = 3", 3 },
        { "UPDATE history SET action = 'other' WHERE sequence = 3", 3 },
        { "UPDATE history SET at = at + interval '1 second' WHERE sequence = 3", 3 },
        { "UPDATE history SET actor_name = 'somebody else' WHERE sequence = 3", 3 },
        { "DELETE FROM history WHERE sequence = 3", 3 },
        { "DELETE FROM history WHERE sequence >= 4", 4 },
        { "UPDATE history SET sequence = sequence + 100 WHERE sequence IN (2, 3); UPDATE history SET sequence = 105 - sequence WHERE sequence > 100", 2 },
        { "TRUNCATE history", 1 },
        { "UPDATE history_head SET hash = decode(repeat('00', 32), 'hex')", 5 },
    };

    [Theory]
    [MemberData(nameof(Tampering))]
    public async Task Verify_AfterAnAdministratorsEdit_SaysWhere(string sql, long where)
    {
        await using var database = await TestDatabase.CreateAsync();
        await using var source = PortalData.OpenDataSource(database.Web);
        var db = new PortalDb(PortalData.OptionsFor(source), TimeProvider.System);
        await AppendAsync(db, 5);
        var before = await new VerifyHistory(db).HandleAsync(Actor);
        Assert.Equal((5, null), (before.Count, before.Break));

        await PlantScene.SqlAsync(database.Superuser, "SET session_replication_role = replica; " + sql);

        var after = await new VerifyHistory(db).HandleAsync(Actor);
        Assert.Equal(where, after.Break?.Sequence);
    }

    [Fact]
    public async Task Append_ByManyAtOnce_LeavesNoGap()
    {
        await using var database = await TestDatabase.CreateAsync();
        await using var source = PortalData.OpenDataSource(database.Web);
        var db = new PortalDb(PortalData.OptionsFor(source), TimeProvider.System);

        await Task.WhenAll(Enumerable.Range(0, 8).Select(_ => AppendAsync(db, 5)));

        var report = await new VerifyHistory(db).HandleAsync(Actor);
        Assert.Equal((40, null), (report.Count, report.Break));
    }

    [Fact]
    public async Task Append_WithoutItsTransaction_LeavesNothing()
    {
        await using var database = await TestDatabase.CreateAsync();
        await using var source = PortalData.OpenDataSource(database.Web);
        var db = new PortalDb(PortalData.OptionsFor(source), TimeProvider.System);
        await AppendAsync(db, 1);
        await using (var session = await db.OpenAsync(Actor))
        {
            session.Tell(Draft(7));
            await session.FlushAsync(TestContext.Current.CancellationToken);
        }

        Assert.Equal(1, (await new VerifyHistory(db).HandleAsync(Actor)).Count);
        await AppendAsync(db, 1);
        Assert.Equal(2, (await new VerifyHistory(db).HandleAsync(Actor)).Count);
    }

    [Fact]
    public async Task Insert_PastTheHead_IsRefusedAtCommit()
    {
        await using var database = await TestDatabase.CreateAsync();
        var refused = await Assert.ThrowsAsync<PostgresException>(() => PlantScene.SqlAsync(
            database.Web,
            """
            INSERT INTO history (sequence, at, actor_name, subject_kind, subject_id, action, content, salt, content_digest, previous_hash, hash)
            VALUES (1, now(), 'forger', 'review', gen_random_uuid(), 'approved', '', '', '', '', '')
            """));
        Assert.Equal("PP002", refused.SqlState);
    }

    [Fact]
    public async Task OpenAsync_TellsTheDatabaseWhoActs()
    {
        await using var database = await TestDatabase.CreateAsync();
        await using var source = PortalData.OpenDataSource(database.Web);
        var db = new PortalDb(PortalData.OptionsFor(source), TimeProvider.System);
        var account = Guid.NewGuid();

        await using var session = await db.OpenAsync(Actor.Of(account));

        var told = await session.Db.Database.SqlQuery<string>($"SELECT current_setting('pathportal.actor') AS \"Value\"").SingleAsync();
        Assert.Equal(account.ToString(), told);
    }

    private static async Task AppendAsync(PortalDb db, int count)
    {
        for (var i = 0; i < count; i++)
        {
            var done = await db.ActAsync<int>(Actor, session =>
            {
                session.Tell(Draft(i));
                return Task.FromResult<PathPortal.Portal.Domain.Outcome<int>>(i);
            });
            Assert.True(done.Succeeded, done.Refusal?.Message);
        }
    }

    private static HistoryDraft Draft(int number) =>
        HistoryDraft.Of(Guid.NewGuid(), "review", Guid.NewGuid(), "approved", ("number", number.ToString(CultureInfo.InvariantCulture)));
}
