using Microsoft.EntityFrameworkCore;
using Npgsql;
using PathPortal.Portal.Data;
using PathPortal.Portal.Data.Provisioning;
using PathPortal.Portal.Tests.Support;
using PathPortal.TestSupport;

namespace PathPortal.Portal.Tests.Storage;

public sealed class MigratorTests
{
    [Fact]
    public async Task RunAsync_Again_ChangesNothing()
    {
        await using var database = await TestDatabase.CreateAsync();
        var report = await new DatabaseMigrator(new(database.Owner, database.Web, database.Worker)).RunAsync();
        Assert.Empty(report.AppliedMigrations);
        Assert.Empty(report.CreatedRoles);
        Assert.True(report.ProtectedByPrivilege);
    }

    [Fact]
    public async Task RunAsync_SeveralAtOnceOnAnEmptyDatabase_AppliesEachMigrationOnce()
    {
        await using var database = await EmptyDatabase.CreateAsync();
        var target = new MigrationTarget(database.Owner, database.Web, database.Worker);

        var reports = await Task.WhenAll(Enumerable.Range(0, 3).Select(_ => new DatabaseMigrator(target).RunAsync()));

        Assert.Single(reports, r => r.AppliedMigrations.Count > 0);
        await using var source = PortalData.OpenDataSource(database.Web);
        Assert.Null(await new PortalSchema(source).WhyNotReadyAsync());
        // What belongs to the database itself is not copied with it, so it is tried here: a temporary table could stand in for a real one.
        foreach (var role in new[] { database.Web, database.Worker })
        {
            var denied = await Assert.ThrowsAsync<PostgresException>(() => PlantScene.SqlAsync(role, "CREATE TEMP TABLE history (id int)"));
            Assert.Equal(PostgresErrorCodes.InsufficientPrivilege, denied.SqlState);
        }
    }

    [Fact]
    public async Task RunAsync_OneRoleForAll_WorksAndSaysThatProtectionIsOff()
    {
        await using var database = await EmptyDatabase.CreateAsync();

        var report = await new DatabaseMigrator(new(database.Owner, database.Owner, database.Owner)).RunAsync();

        Assert.False(report.ProtectedByPrivilege);
        Assert.Contains(report.Lines(), line => line.Contains("privilege is off", StringComparison.Ordinal));
        await using var source = PortalData.OpenDataSource(database.Owner);
        Assert.Null(await new PortalSchema(source).WhyNotReadyAsync());
    }

    [Fact]
    public async Task WhyNotReady_BeforeMigrationOrWithoutDatabase_SaysWhatToDo()
    {
        await using var database = await EmptyDatabase.CreateAsync();
        await using var empty = PortalData.OpenDataSource(database.Owner);
        Assert.Contains("migrate", await new PortalSchema(empty).WhyNotReadyAsync(), StringComparison.Ordinal);

        var nowhere = new NpgsqlConnectionStringBuilder(database.Owner) { Port = 1 }.ConnectionString;
        await using var absent = PortalData.OpenDataSource(nowhere);
        Assert.Contains("does not answer", await new PortalSchema(absent).WhyNotReadyAsync(), StringComparison.Ordinal);
    }

    [Fact]
    public async Task Schema_Expected_IsTheNewestMigrationAndTheModelHasNoMore()
    {
        var database = await SharedDatabase.GetAsync();
        await using var source = PortalData.OpenDataSource(database.Owner);
        await using var db = new PortalDbContext(PortalData.OptionsFor(source));
        Assert.Equal(PortalSchema.Expected, db.Database.GetMigrations().Last());
        Assert.False(db.Database.HasPendingModelChanges(), "The model changed without a migration: run dotnet ef migrations add.");
    }

    [Fact]
    public async Task Schema_ApplicationNewerThanDatabase_IsNotReady()
    {
        await using var database = await TestDatabase.CreateAsync();
        await PlantScene.SqlAsync(database.Superuser, "DELETE FROM applied_migrations WHERE \"MigrationId\" = $1", PortalSchema.Expected);
        await using var source = PortalData.OpenDataSource(database.Web);
        Assert.Contains(PortalSchema.Expected, await new PortalSchema(source).WhyNotReadyAsync(), StringComparison.Ordinal);
    }

    /// <summary>A database of the owner's without any table.</summary>
    private sealed class EmptyDatabase : IAsyncDisposable
    {
        private readonly string _server;
        private readonly string _name;

        private EmptyDatabase(string server, string name, TestDatabase like)
        {
            (_server, _name) = (server, name);
            Owner = In(like.Owner);
            Web = In(like.Web);
            Worker = In(like.Worker);
        }

        public string Owner { get; }

        public string Web { get; }

        public string Worker { get; }

        public static async Task<EmptyDatabase> CreateAsync()
        {
            // The roles are there once any test database is.
            var like = await SharedDatabase.GetAsync();
            var server = await PostgresServer.SuperuserConnectionStringAsync();
            var name = $"test_{Guid.NewGuid():N}";
            await PlantScene.SqlAsync(server, $"CREATE DATABASE {name} OWNER pathportal_owner");
            return new(server, name, like);
        }

        public async ValueTask DisposeAsync() => await PlantScene.SqlAsync(_server, $"DROP DATABASE IF EXISTS {_name} WITH (FORCE)");

        private string In(string connectionString) => new NpgsqlConnectionStringBuilder(connectionString) { Database = _name }.ConnectionString;
    }
}
