namespace PathPortal.Cli;

/// <summary>What the commands read from the environment.</summary>
internal static class Settings
{
    public const string OwnerVariable = "PATHPORTAL_OWNER_DB";
    public const string WebVariable = "PATHPORTAL_WEB_DB";
    public const string WorkerVariable = "PATHPORTAL_WORKER_DB";

    public static string Owner => Read(OwnerVariable) ?? throw new CommandException($"{OwnerVariable} is not set: the connection string of the role that owns the database.");

    public static string? Read(string variable) => Environment.GetEnvironmentVariable(variable) is { Length: > 0 } value ? value : null;
}
