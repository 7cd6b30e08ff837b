using Npgsql;

namespace PathPortal.Portal.Data.Provisioning;

/// <summary>The login roles of web and worker. Roles belong to the whole server, so another database's migration may make the same at once.</summary>
internal sealed class DatabaseRoles(NpgsqlConnection connection)
{
    /// <summary>Makes the role when it is missing; true when it did. An existing role keeps its password.</summary>
    public async Task<bool> EnsureAsync(string name, string? password, CancellationToken cancellation)
    {
        if (await ExistsAsync(name, cancellation))
            return false;
        if (string.IsNullOrEmpty(password))
            throw new InvalidOperationException($"The database role {name} is missing, and its connection string has no password to make it with.");
        var statement = await FormatAsync(
            """
            DO $do$ BEGIN
                CREATE ROLE %I LOGIN NOSUPERUSER NOCREATEDB NOCREATEROLE PASSWORD %L;
            EXCEPTION WHEN duplicate_object OR unique_violation THEN NULL;
            END $do$
            """,
            [name, password], cancellation);
        await using var create = new NpgsqlCommand(statement, connection);
        await create.ExecuteNonQueryAsync(cancellation);
        return true;
    }

    private async Task<bool> ExistsAsync(string name, CancellationToken cancellation)
    {
        await using var command = new NpgsqlCommand("SELECT EXISTS (SELECT FROM pg_roles WHERE rolname = $1)", connection);
        command.Parameters.Add(new() { Value = name });
        return (bool)(await command.ExecuteScalarAsync(cancellation))!;
    }

    // Role statements take no parameters; the database quotes names and literals itself.
    private async Task<string> FormatAsync(string format, string[] values, CancellationToken cancellation)
    {
        await using var command = new NpgsqlCommand("SELECT format($1, VARIADIC $2::text[])", connection);
        command.Parameters.Add(new() { Value = format });
        command.Parameters.Add(new() { Value = values });
        return (string)(await command.ExecuteScalarAsync(cancellation))!;
    }
}
