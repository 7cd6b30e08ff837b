using Npgsql;
using PathPortal.TestSupport;

namespace PathPortal.Portal.Tests;

/// <summary>The ground the other database tests stand on.</summary>
public sealed class TestDatabaseTests
{
    [Fact]
    public async Task CreateAsync_Twice_GivesDatabasesThatDoNotSeeEachOther()
    {
        await using var first = await TestDatabase.CreateAsync();
        await using var second = await TestDatabase.CreateAsync();

        await ScalarAsync(first.Owner, "CREATE TABLE only_here (id int)");

        Assert.Equal(1L, await ScalarAsync(first.Owner, "SELECT count(*) FROM pg_tables WHERE tablename = 'only_here'"));
        Assert.Equal(0L, await ScalarAsync(second.Owner, "SELECT count(*) FROM pg_tables WHERE tablename = 'only_here'"));
    }

    [Fact]
    public async Task CreateAsync_Owner_IsNoSuperuser()
    {
        await using var database = await TestDatabase.CreateAsync();

        Assert.Equal(false, await ScalarAsync(database.Owner, "SELECT rolsuper FROM pg_roles WHERE rolname = current_user"));
        Assert.Equal(true, await ScalarAsync(database.Superuser, "SELECT rolsuper FROM pg_roles WHERE rolname = current_user"));
    }

    [Fact]
    public async Task DisposeAsync_WithAnOpenConnection_LeavesNoDatabase()
    {
        var database = await TestDatabase.CreateAsync();
        await using var open = new NpgsqlConnection(database.Owner);
        await open.OpenAsync(TestContext.Current.CancellationToken);

        await database.DisposeAsync();

        var name = new NpgsqlConnectionStringBuilder(database.Owner).Database;
        var server = await PostgresServer.SuperuserConnectionStringAsync();
        Assert.Equal(0L, await ScalarAsync(server, $"SELECT count(*) FROM pg_database WHERE datname = '{name}'"));
    }

    [Fact]
    public async Task PrivatePostgres_KilledAndStartedAgain_KeepsWhatWasCommitted()
    {
        var cancellation = TestContext.Current.CancellationToken;
        await using var server = await PrivatePostgres.StartAsync(cancellation);
        await ScalarAsync(server.ConnectionString, "CREATE TABLE kept AS SELECT 7 AS value");

        await server.KillAsync(cancellation);
        await Assert.ThrowsAnyAsync<NpgsqlException>(() => ScalarAsync(server.ConnectionString, "SELECT 1"));
        await server.StartAgainAsync(cancellation);

        Assert.Equal(7, await ScalarAsync(server.ConnectionString, "SELECT value FROM kept"));
    }

    private static async Task<object?> ScalarAsync(string connectionString, string sql)
    {
        await using var connection = new NpgsqlConnection(connectionString + ";Pooling=false");
        await connection.OpenAsync(TestContext.Current.CancellationToken);
        await using var command = new NpgsqlCommand(sql, connection);
        return await command.ExecuteScalarAsync(TestContext.Current.CancellationToken);
    }
}
