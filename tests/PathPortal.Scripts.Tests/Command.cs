using System.Diagnostics;
using PathPortal.TestSupport;

namespace PathPortal.Scripts.Tests;

/// <summary>One finite command, run in the repository's root; a name with a folder is relative to it.</summary>
internal sealed record Command(int ExitCode, string Output, string Error)
{
    public static async Task<Command> RunAsync(string file, string[] arguments, Dictionary<string, string>? environment = null)
    {
        var start = new ProcessStartInfo(file.Contains('/') ? Path.Combine(TestPaths.RepositoryRoot, file) : file, arguments)
        {
            WorkingDirectory = TestPaths.RepositoryRoot,
            RedirectStandardInput = true,
            RedirectStandardOutput = true,
            RedirectStandardError = true,
        };
        foreach (var (name, value) in environment ?? [])
            start.Environment[name] = value;
        using var process = Process.Start(start)!;
        process.StandardInput.Close();
        var output = process.StandardOutput.ReadToEndAsync();
        var error = process.StandardError.ReadToEndAsync();
        await process.WaitForExitAsync(TestContext.Current.CancellationToken);
        return new Command(process.ExitCode, await output, await error);
    }

    /// <summary>Whether the machine has the program.</summary>
    public static bool Exists(string program) =>
        (Environment.GetEnvironmentVariable("PATH") ?? "").Split(':').Any(folder => File.Exists(Path.Combine(folder, program)));
}
