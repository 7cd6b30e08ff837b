namespace PathPortal.Portal.Data.Provisioning;

/// <summary>The job engine's own tables, made by the owner in the same database.</summary>
internal static class JobTables
{
    /// <summary>How the engine's tables begin; web and worker may read and write all of them.</summary>
    public const string Prefix = "qrtz_";

    public static Task ProvisionAsync(string ownerConnectionString, CancellationToken cancellation)
    {
        ArgumentException.ThrowIfNullOrEmpty(ownerConnectionString);
        cancellation.ThrowIfCancellationRequested();
        return Task.CompletedTask;
    }
}
