namespace PathPortal.Portal.Data.Provisioning;

/// <summary>The connection strings of the three roles. Web and worker may be the owner's again, at the price of protection by privilege.</summary>
public sealed record MigrationTarget(string Owner, string Web, string Worker);
