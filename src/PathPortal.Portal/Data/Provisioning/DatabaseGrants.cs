using Npgsql;

namespace PathPortal.Portal.Data.Provisioning;

/// <summary>Takes everything from the two roles and gives back what <see cref="TableRights"/> says, in the caller's transaction.</summary>
internal sealed class DatabaseGrants(NpgsqlConnection connection)
{
    /// <param name="web">Name of the web's role; null when it is the owner.</param>
    /// <param name="worker">Name of the worker's role; null when it is the owner.</param>
    public async Task ApplyAsync(string? web, string? worker, CancellationToken cancellation)
    {
        var quote = new NpgsqlCommandBuilder();
        List<string> sql =
        [
            "REVOKE ALL ON SCHEMA public FROM PUBLIC;",
            $"REVOKE ALL ON DATABASE {quote.QuoteIdentifier(connection.Database)} FROM PUBLIC;",
        ];
        foreach (var role in new[] { web, worker }.OfType<string>().Distinct())
        {
            var name = quote.QuoteIdentifier(role);
            sql.Add($"GRANT CONNECT ON DATABASE {quote.QuoteIdentifier(connection.Database)} TO {name};");
            sql.Add($"GRANT USAGE ON SCHEMA public TO {name};");
            sql.Add($"REVOKE ALL ON ALL TABLES IN SCHEMA public FROM {name};");
            sql.Add($"REVOKE ALL ON ALL SEQUENCES IN SCHEMA public FROM {name};");
            sql.Add($"REVOKE ALL ON ALL TABLES IN SCHEMA {JobTables.Schema} FROM {name};");
        }
        foreach (var table in TableRights.All)
        {
            Grant(sql, quote, table.Table, table.Web, web);
            Grant(sql, quote, table.Table, table.Worker, worker);
        }
        sql.AddRange(JobTables.Grants(Quoted(quote, web), Quoted(quote, worker)));
        await using var command = new NpgsqlCommand(string.Join('\n', sql), connection);
        await command.ExecuteNonQueryAsync(cancellation);
    }

    private static void Grant(List<string> sql, NpgsqlCommandBuilder quote, string table, string rights, string? role)
    {
        if (role is not null && rights.Length > 0)
            sql.Add($"GRANT {rights} ON {quote.QuoteIdentifier(table)} TO {quote.QuoteIdentifier(role)};");
    }

    private static string? Quoted(NpgsqlCommandBuilder quote, string? role) => role is null ? null : quote.QuoteIdentifier(role);
}
