namespace PathPortal.Scripts.Tests;

/// <summary>How <c>scripts/test</c> counts: a project that crashes or runs nothing must not look like a success.</summary>
public sealed class ClosingLineTests : IDisposable
{
    private readonly string _folder = Directory.CreateTempSubdirectory("pathportal-count-").FullName;

    public void Dispose() => Directory.Delete(_folder, recursive: true);

    [Theory]
    [InlineData("total=\"5\" executed=\"4\" passed=\"4\" failed=\"0\"", 0, "4 0 1")]
    [InlineData("total=\"5\" executed=\"5\" passed=\"3\" failed=\"2\"", 1, "3 2 0")]
    [InlineData("total=\"5\" executed=\"5\" passed=\"5\" failed=\"0\"", 134, "5 1 0")]
    [InlineData("total=\"0\" executed=\"0\" passed=\"0\" failed=\"0\"", 0, "0 1 0")]
    [InlineData("total=\"2\" executed=\"0\" passed=\"0\" failed=\"0\"", 0, "0 1 2")]
    [InlineData(null, 139, "0 1 0")]
    [InlineData(null, 0, "0 1 0")]
    public async Task CountJob_ReportAndExitCode_AddsUp(string? counters, int exitCode, string passedFailedSkipped)
    {
        await File.WriteAllTextAsync(Path.Combine(_folder, "Some.log"), "what it said\n", TestContext.Current.CancellationToken);
        if (counters is not null)
            await File.WriteAllTextAsync(Path.Combine(_folder, "Some.trx"), $"<TestRun><Counters {counters} error=\"0\" /></TestRun>", TestContext.Current.CancellationToken);

        var script = $"set -euo pipefail; . scripts/lib/test-projects.sh; RESULTS={_folder}; count_job Some {exitCode} 1 >&2; echo $passed $failed $skipped";
        var result = await Command.RunAsync("bash", ["-c", script]);

        Assert.Equal((0, passedFailedSkipped), (result.ExitCode, result.Output.Trim()));
    }

    [Fact]
    public async Task Test_UnknownProject_IsRefused()
    {
        var result = await Command.RunAsync("scripts/test", ["NoSuchProject"]);

        Assert.Equal((1, "test: there is no test project tests/PathPortal.NoSuchProject.Tests"), (result.ExitCode, result.Error.Trim()));
    }
}
