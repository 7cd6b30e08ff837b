namespace PathPortal.TestSupport;

/// <summary>Where the repository's own files are, seen from a test's output folder.</summary>
public static class TestPaths
{
    /// <summary>The folder that holds the solution file.</summary>
    public static string RepositoryRoot { get; } = FindRoot();

    private static string FindRoot()
    {
        for (DirectoryInfo? folder = new(AppContext.BaseDirectory); folder is not null; folder = folder.Parent)
        {
            if (File.Exists(Path.Combine(folder.FullName, "PathPortal.sln")))
                return folder.FullName;
        }

        throw new InvalidOperationException($"No PathPortal.sln above {AppContext.BaseDirectory}: tests run from a clone of the repository.");
    }
}
