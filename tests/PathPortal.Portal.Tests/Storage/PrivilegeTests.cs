using Npgsql;
using PathPortal.Portal.Data.Provisioning;
using PathPortal.Portal.Tests.Support;
using PathPortal.TestSupport;

namespace PathPortal.Portal.Tests.Storage;

/// <summary>What the roles of web and worker may do, asked of the database's own catalogue and by trying.</summary>
public sealed class PrivilegeTests
{
    private const string InsufficientPrivilege = "42501";

    public static TheoryData<bool, string> Forbidden()
    {
        var data = new TheoryData<bool, string>();
        foreach (var worker in new[] { false, true })
        {
            foreach (var statement in new[]
            {
                "UPDATE history SET action = 'x'", "DELETE FROM history", "TRUNCATE history", "DELETE FROM history_head", "TRUNCATE history_head",
                "UPDATE decisions SET reason = 'x'", "DELETE FROM decisions", "TRUNCATE decisions", "UPDATE revisions SET note = 'x'",
                "DELETE FROM runs", "DELETE FROM reviews", "UPDATE review_transitions SET why = 'x'", "CREATE TABLE mine (id int)",
                "ALTER TABLE history DISABLE TRIGGER ALL", "SET session_replication_role = replica",
                "DROP TABLE history",
            })
                data.Add(worker, statement);
        }
        data.Add(true, "SELECT password_hash FROM accounts");
        data.Add(true, "INSERT INTO decisions DEFAULT VALUES");
        data.Add(false, "DELETE FROM accounts");
        data.Add(false, "UPDATE plant_roles SET role = 'Lead'");
        return data;
    }

    [Theory]
    [MemberData(nameof(Forbidden))]
    public async Task Statement_NotGranted_IsDeniedByPrivilege(bool worker, string sql)
    {
        var database = await SharedDatabase.GetAsync();
        var denied = await Assert.ThrowsAsync<PostgresException>(() => PlantScene.SqlAsync(worker ? database.Worker : database.Web, sql));
        Assert.Equal(InsufficientPrivilege, denied.SqlState);
    }

    [Theory]
    [InlineData("pathportal_web", false)]
    [InlineData("pathportal_worker", true)]
    public async Task Grants_InTheCatalogue_AreThoseWrittenDown(string role, bool worker)
    {
        var database = await SharedDatabase.GetAsync();
        var found = await ListAsync(database.Superuser,
            """
            SELECT table_name || ' ' || privilege_type FROM information_schema.role_table_grants
            WHERE grantee = $1 AND table_schema = 'public'
            UNION
            SELECT table_name || ' ' || privilege_type || ' (' || column_name || ')' FROM information_schema.column_privileges c
            WHERE grantee = $1 AND table_schema = 'public' AND NOT EXISTS (
                SELECT FROM information_schema.role_table_grants t
                WHERE t.grantee = c.grantee AND t.table_name = c.table_name AND t.privilege_type = c.privilege_type)
            """, role);
        var written = TableRights.All.SelectMany(t => (worker ? t.Worker : t.Web).Split(", ", StringSplitOptions.RemoveEmptyEntries).Select(r => $"{t.Table} {r}"));
        Assert.Equal(written.Order(StringComparer.Ordinal), found.Order(StringComparer.Ordinal));
    }

    [Fact]
    public async Task Tables_InTheCatalogue_AreAllDecidedOn()
    {
        var database = await SharedDatabase.GetAsync();
        var found = await ListAsync(database.Superuser, "SELECT tablename FROM pg_tables WHERE schemaname = $1", "public");
        Assert.Equal(TableRights.All.Select(t => t.Table).Order(StringComparer.Ordinal), found.Order(StringComparer.Ordinal));
    }

    [Fact]
    public async Task Owner_PastItsPrivileges_StillMeetsTheRules()
    {
        await using var scene = await PlantScene.CreateAsync();
        await scene.UploadAsync(1);
        foreach (var sql in new[] { "UPDATE history SET action = 'x'", "DELETE FROM history", "TRUNCATE history", "UPDATE revisions SET note = 'x'", "DELETE FROM history_head" })
        {
            var refused = await Assert.ThrowsAsync<PostgresException>(() => PlantScene.SqlAsync(scene.Database.Owner, sql));
            Assert.Equal("PP003", refused.SqlState);
        }
    }

    private static async Task<List<string>> ListAsync(string connectionString, string sql, string value)
    {
        await using var connection = new NpgsqlConnection(connectionString + ";Pooling=false");
        await connection.OpenAsync();
        await using var command = new NpgsqlCommand(sql, connection);
        command.Parameters.Add(new() { Value = value });
        await using var reader = await command.ExecuteReaderAsync();
        List<string> rows = [];
        while (await reader.ReadAsync())
            rows.Add(reader.GetString(0));
        return rows;
    }
}
