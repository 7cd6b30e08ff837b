namespace PathPortal.Portal.Data.Provisioning;

/// <summary>What the migrate command did, in sentences for the terminal.</summary>
public sealed record MigrationReport(IReadOnlyList<string> AppliedMigrations, IReadOnlyList<string> CreatedRoles, bool ProtectedByPrivilege)
{
    public IEnumerable<string> Lines()
    {
        yield return AppliedMigrations.Count == 0
            ? "The tables were current already."
            : "Migrations applied: " + string.Join(", ", AppliedMigrations) + ".";
        if (CreatedRoles.Count > 0)
            yield return "Database roles made: " + string.Join(", ", CreatedRoles) + ".";
        yield return ProtectedByPrivilege
            ? "Web and worker have roles of their own; neither can change the history."
            : "Protection by privilege is off: web or worker connects as the owner of the tables and could change the history.";
    }
}
