using PathPortal.TestSupport;

namespace PathPortal.Portal.Tests.Support;

/// <summary>One migrated database for tests that change nothing in it; it goes with the server.</summary>
internal static class SharedDatabase
{
    private static readonly Lazy<Task<TestDatabase>> Database = new(TestDatabase.CreateAsync);

    public static Task<TestDatabase> GetAsync() => Database.Value;
}
