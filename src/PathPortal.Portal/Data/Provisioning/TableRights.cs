namespace PathPortal.Portal.Data.Provisioning;

/// <summary>What the roles of web and worker may do with one table. Nothing else is granted.</summary>
/// <param name="Web">Privileges as in a GRANT statement; empty for none.</param>
/// <param name="Worker">The same for the worker's role.</param>
public sealed record TableRights(string Table, string Web, string Worker)
{
    private const string Read = "SELECT";
    private const string Append = "SELECT, INSERT";
    private const string Edit = "SELECT, INSERT, UPDATE";

    /// <summary>Every table of the portal. A table that is missing here can't be used by anyone but the owner; a test compares with the catalogue.</summary>
    public static IReadOnlyList<TableRights> All { get; } =
    [
        new("accounts", Edit, ""),
        new("account_claims", Edit + ", DELETE", ""),
        new("account_logins", Edit + ", DELETE", ""),
        new("account_tokens", Edit + ", DELETE", ""),
        new("account_passkeys", Edit + ", DELETE", ""),
        // The update of one column is what locking a row for reading asks for; a role is given and taken, never changed.
        new("plant_roles", "SELECT, INSERT, DELETE, UPDATE (given_at)", ""),
        new("plants", Edit, Read),
        new("parts", Edit, Read),
        new("arm_models", Edit, Read),
        new("arm_model_versions", Append, Read),
        new("cells", Edit, Read),
        new("cell_setups", Append, Read),
        new("criteria_sheets", Edit, Read),
        new("criteria_sheet_versions", Append, Read),
        new("programs", Edit, Read),
        new("revisions", Append, Read),
        new("assignments", Edit, Read),
        new("controller_files", Append, Read),
        new("runs", Edit, Edit),
        new("run_requests", Append, Append),
        new("workers", Read, Edit + ", DELETE"),
        new("reviews", Edit, "SELECT, UPDATE"),
        new("review_transitions", Append, Append),
        new("decisions", Append, Read),
        new("history", Append, Append),
        new("history_head", "SELECT, UPDATE", "SELECT, UPDATE"),
        new(PortalData.MigrationsTable, Read, Read),
    ];
}
