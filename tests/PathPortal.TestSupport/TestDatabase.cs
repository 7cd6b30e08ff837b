using Npgsql;

namespace PathPortal.TestSupport;

/// <summary>A migrated, empty PostgreSQL database of one test's own, dropped when disposed. Tests may make them side by side.</summary>
public sealed class TestDatabase : IAsyncDisposable
{
    private static readonly Lazy<Task<string>> Template = new(
        async () => await TemplateDatabase.EnsureAsync(await PostgresServer.SuperuserConnectionStringAsync()));

    private readonly string _name;
    private readonly string _server;

    private TestDatabase(string name, string server)
    {
        var roles = new TestRoles(server);
        (_name, _server) = (name, server);
        Superuser = roles.Superuser(name);
        Owner = roles.OwnerOf(name);
        Web = roles.Web(name);
        Worker = roles.Worker(name);
    }

    /// <summary>A database administrator's connection string: whoever holds it gets past every privilege.</summary>
    public string Superuser { get; }

    /// <summary>The connection string of the role that owns schema and tables, which only the <c>migrate</c> command uses.</summary>
    public string Owner { get; }

    /// <summary>The web process's connection string.</summary>
    public string Web { get; }

    /// <summary>The worker process's connection string.</summary>
    public string Worker { get; }

    /// <summary>Copies the migrated template. Privileges on the database itself, such as CONNECT, are not part of a copy.</summary>
    public static async Task<TestDatabase> CreateAsync()
    {
        var server = await PostgresServer.SuperuserConnectionStringAsync();
        var name = $"test_{Guid.NewGuid():N}";
        await ExecuteAsync(server, $"CREATE DATABASE {name} TEMPLATE {await Template.Value} OWNER pathportal_owner");
        return new TestDatabase(name, server);
    }

    public async ValueTask DisposeAsync()
    {
        foreach (var pooled in new[] { Superuser, Owner, Web, Worker })
        {
            await using var connection = new NpgsqlConnection(pooled);
            NpgsqlConnection.ClearPool(connection);
        }

        await ExecuteAsync(_server, $"DROP DATABASE IF EXISTS {_name} WITH (FORCE)");
    }

    private static async Task ExecuteAsync(string connectionString, string sql)
    {
        await using var connection = new NpgsqlConnection(connectionString);
        await connection.OpenAsync();
        await using var command = new NpgsqlCommand(sql, connection);
        await command.ExecuteNonQueryAsync();
    }
}
