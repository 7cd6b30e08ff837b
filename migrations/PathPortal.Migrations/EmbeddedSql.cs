namespace PathPortal.Migrations;

/// <summary>Statements that a migration runs and the tool can't generate. A file that was applied anywhere is never edited.</summary>
internal static class EmbeddedSql
{
    public static string Read(string name)
    {
        using var stream = typeof(EmbeddedSql).Assembly.GetManifestResourceStream($"PathPortal.Migrations.Sql.{name}.sql")
            ?? throw new InvalidOperationException($"No embedded statements named {name}.");
        using var reader = new StreamReader(stream);
        return reader.ReadToEnd();
    }
}
