using Microsoft.AspNetCore.Identity;
using Microsoft.EntityFrameworkCore;
using Microsoft.Extensions.DependencyInjection;
using Microsoft.Extensions.DependencyInjection.Extensions;
using Microsoft.Extensions.Options;
using Npgsql;
using PathPortal.Portal.Domain.People;

namespace PathPortal.Portal.Data;

/// <summary>Registers the database for a process, and the rules of signing in that every process must share.</summary>
public static class PortalData
{
    public const string MigrationsAssembly = "PathPortal.Migrations";
    public const string MigrationsTable = "applied_migrations";

    /// <summary>Adds <see cref="PortalDb"/>, and the context for Identity's stores.</summary>
    public static IServiceCollection AddPortalData(this IServiceCollection services, string connectionString)
    {
        services.TryAddSingleton(TimeProvider.System);
        services.AddSingleton(_ => OpenDataSource(connectionString));
        services.AddDbContextFactory<PortalDbContext>((provider, options) => Configure(options, provider.GetRequiredService<NpgsqlDataSource>()));
        services.Configure<IdentityOptions>(ConfigureIdentity);
        services.Configure<PasswordHasherOptions>(ConfigureHasher);
        services.AddSingleton<PortalDb>();
        services.AddSingleton<PortalSchema>();
        return services;
    }

    public static NpgsqlDataSource OpenDataSource(string connectionString)
    {
        var settings = new NpgsqlConnectionStringBuilder(connectionString);
        // A database that is down must be told within seconds, also to those who wait for a connection of the pool.
        if (!settings.ContainsKey("Timeout"))
            settings.Timeout = 5;
        return NpgsqlDataSource.Create(settings);
    }

    public static void Configure(DbContextOptionsBuilder options, NpgsqlDataSource source) =>
        options.UseNpgsql(source, Configure);

    public static DbContextOptions<PortalDbContext> OptionsFor(NpgsqlDataSource source)
    {
        var options = new DbContextOptionsBuilder<PortalDbContext>();
        Configure(options, source);
        return options.Options;
    }

    /// <summary>Names are e-mail addresses; passwords are judged by length and not by kinds of characters (NIST SP 800-63B, from memory).</summary>
    public static void ConfigureIdentity(IdentityOptions options)
    {
        options.Stores.SchemaVersion = IdentitySchemaVersions.Version3;
        options.User.RequireUniqueEmail = true;
        options.Password.RequiredLength = PasswordRules.MinLength;
        options.Password.RequireDigit = false;
        options.Password.RequireLowercase = false;
        options.Password.RequireUppercase = false;
        options.Password.RequireNonAlphanumeric = false;
        options.Password.RequiredUniqueChars = 5;
        options.Lockout.AllowedForNewUsers = true;
        options.Lockout.MaxFailedAccessAttempts = 10;
        options.Lockout.DefaultLockoutTimeSpan = TimeSpan.FromMinutes(5);
    }

    /// <summary>The hasher every process uses, for commands that sign nobody in.</summary>
    public static PasswordHasher<Account> CreateHasher()
    {
        var options = new PasswordHasherOptions();
        ConfigureHasher(options);
        return new(Options.Create(options));
    }

    // OWASP's figure for PBKDF2 with HMAC-SHA-512 (password storage cheat sheet, from memory).
    private static void ConfigureHasher(PasswordHasherOptions options) => options.IterationCount = 210_000;

    private static void Configure(Npgsql.EntityFrameworkCore.PostgreSQL.Infrastructure.NpgsqlDbContextOptionsBuilder postgres) =>
        postgres.MigrationsAssembly(MigrationsAssembly).MigrationsHistoryTable(MigrationsTable);
}
