using Microsoft.EntityFrameworkCore;
using Npgsql;

namespace PathPortal.Portal.Data.Provisioning;

/// <summary>
/// Brings a database up to date as its owner: tables, the job engine's tables, the roles of web and worker and what each may do. Safe to
/// run again, and by several at once.
/// </summary>
public sealed class DatabaseMigrator(MigrationTarget target)
{
    // Any number will do; every build must use the same.
    private const long LockKey = 0x7061_7468_706f_7274;

    public async Task<MigrationReport> RunAsync(CancellationToken cancellation = default)
    {
        // A session of its own holds the lock, unpooled so that closing it gives the lock back.
        await using var guard = new NpgsqlConnection(new NpgsqlConnectionStringBuilder(target.Owner) { Pooling = false }.ConnectionString);
        await guard.OpenAsync(cancellation);
        await using (var take = new NpgsqlCommand("SELECT pg_advisory_lock($1)", guard) { CommandTimeout = 600 })
        {
            take.Parameters.Add(new() { Value = LockKey });
            await take.ExecuteNonQueryAsync(cancellation);
        }

        await using var source = PortalData.OpenDataSource(target.Owner);
        var applied = await MigrateAsync(source, cancellation);
        await JobTables.ProvisionAsync(source, cancellation);

        await using var connection = await source.OpenConnectionAsync(cancellation);
        await using var transaction = await connection.BeginTransactionAsync(cancellation);
        var roles = new DatabaseRoles(connection);
        var owner = new NpgsqlConnectionStringBuilder(target.Owner).Username;
        var web = new NpgsqlConnectionStringBuilder(target.Web);
        var worker = new NpgsqlConnectionStringBuilder(target.Worker);
        List<string> created = [];
        foreach (var role in new[] { web, worker }.Where(r => r.Username != owner))
        {
            if (await roles.EnsureAsync(role.Username!, role.Password, cancellation))
                created.Add(role.Username!);
        }
        var grants = new DatabaseGrants(connection);
        await grants.ApplyAsync(
            web.Username == owner ? null : web.Username, worker.Username == owner ? null : worker.Username, cancellation);
        await transaction.CommitAsync(cancellation);
        return new(applied, created, web.Username != owner && worker.Username != owner);
    }

    private static async Task<IReadOnlyList<string>> MigrateAsync(NpgsqlDataSource source, CancellationToken cancellation)
    {
        await using var db = new PortalDbContext(PortalData.OptionsFor(source));
        List<string> pending = [.. await db.Database.GetPendingMigrationsAsync(cancellation)];
        await db.Database.MigrateAsync(cancellation);
        return pending;
    }
}
