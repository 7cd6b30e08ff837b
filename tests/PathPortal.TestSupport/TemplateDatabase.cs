using System.Reflection;
using Npgsql;
using PathPortal.Portal.Data.Provisioning;

namespace PathPortal.TestSupport;

/// <summary>
/// A migrated, empty database that tests copy instead of migrating their own. Test processes on one server share it, so its name
/// carries the identity of the code that made it.
/// </summary>
internal static class TemplateDatabase
{
    // Any number will do; every test process must use the same.
    private const long LockKey = 0x7061_7468_7465_7374;

    // Their content decides what a migrated database looks like.
    private static readonly string[] Makers = ["PathPortal.Portal", "PathPortal.Migrations"];

    public static async Task<string> EnsureAsync(string superuserConnectionString)
    {
        // Unpooled, so that closing it gives the lock back and no idle connection keeps a database from being copied.
        var server = new NpgsqlConnectionStringBuilder(superuserConnectionString) { Pooling = false }.ConnectionString;
        var name = "template_" + string.Join('_', Makers.Select(Identity));
        await using var superuser = new NpgsqlConnection(server);
        await superuser.OpenAsync();
        await ExecuteAsync(superuser, $"SELECT pg_advisory_lock({LockKey})");
        if (await ExistsAsync(superuser, name))
            return name;

        // Migrated under another name first: a template half made by a process that died must not be found by the next.
        var draft = name + "_draft";
        var roles = new TestRoles(server);
        await roles.EnsureOwnerAsync(superuser);
        await ExecuteAsync(superuser, $"DROP DATABASE IF EXISTS {draft} WITH (FORCE)");
        await ExecuteAsync(superuser, $"CREATE DATABASE {draft} OWNER pathportal_owner");
        await new DatabaseMigrator(new(roles.OwnerOf(draft), roles.Web(draft), roles.Worker(draft))).RunAsync();
        await ExecuteAsync(superuser, $"ALTER DATABASE {draft} RENAME TO {name}");
        return name;
    }

    private static string Identity(string assembly) => Assembly.Load(assembly).ManifestModule.ModuleVersionId.ToString("N")[..12];

    private static async Task<bool> ExistsAsync(NpgsqlConnection superuser, string name)
    {
        await using var command = new NpgsqlCommand("SELECT EXISTS (SELECT FROM pg_database WHERE datname = $1)", superuser)
        {
            Parameters = { new() { Value = name } },
        };
        return (bool)(await command.ExecuteScalarAsync())!;
    }

    private static async Task ExecuteAsync(NpgsqlConnection connection, string sql)
    {
        await using var command = new NpgsqlCommand(sql, connection);
        await command.ExecuteNonQueryAsync();
    }
}
