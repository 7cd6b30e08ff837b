using Npgsql;

namespace PathPortal.Portal.Data;

/// <summary>Whether the database has exactly the tables this build expects. Web and worker never migrate; they wait.</summary>
public sealed class PortalSchema(NpgsqlDataSource source)
{
    /// <summary>The newest migration. Change it with every migration; a test compares.</summary>
    public const string Expected = "20261201122718_RunBatches";

    /// <summary>Null when the database is current, else why not.</summary>
    public async Task<string?> WhyNotReadyAsync(CancellationToken cancellation = default)
    {
        try
        {
            await using var command = source.CreateCommand($"SELECT max(\"MigrationId\") FROM {PortalData.MigrationsTable}");
            var found = await command.ExecuteScalarAsync(cancellation) as string;
            return found == Expected ? null
                : string.CompareOrdinal(found, Expected) > 0 ? $"The database is newer ({found}) than this build ({Expected})."
                : $"The database is at {found ?? "no migration"}; this build needs {Expected}. Run the migrate command.";
        }
        catch (PostgresException e) when (e.SqlState is PostgresErrorCodes.UndefinedTable or PostgresErrorCodes.InsufficientPrivilege)
        {
            return "The database has no tables for this build. Run the migrate command.";
        }
        catch (NpgsqlException e)
        {
            return "The database does not answer: " + e.Message;
        }
    }
}
