namespace PathPortal.TestSupport;

/// <summary>The PostgreSQL server all tests of a process share: the one <c>scripts/test</c> started, or else one of this process's own.</summary>
public static class PostgresServer
{
    private static readonly Lazy<Task<string>> Shared = new(FindAsync);

    // Held for as long as the process lives: the server goes when its keeper's input is closed.
    private static PrivatePostgres? s_own;

    /// <summary>The superuser's connection to the database <c>postgres</c>.</summary>
    public static Task<string> SuperuserConnectionStringAsync() => Shared.Value;

    private static async Task<string> FindAsync()
    {
        if (Environment.GetEnvironmentVariable("PATHPORTAL_TEST_DB") is { Length: > 0 } given)
            return given;
        s_own = await PrivatePostgres.StartAsync();
        return s_own.ConnectionString;
    }
}
