using System.Globalization;
using System.Net;
using System.Net.Sockets;

namespace PathPortal.Scripts.Tests;

/// <summary><c>scripts/run</c> from outside: what a newcomer sees, and what stays behind.</summary>
public sealed class RunTests(Installation installation) : IClassFixture<Installation>
{
    private const UnixFileMode OwnerOnly = UnixFileMode.UserRead | UnixFileMode.UserWrite;

    [Fact]
    public async Task Run_Terminated_ServedPagesAndLeavesNoProcess()
    {
        await using var portal = RunningPortal.Start(installation);
        await portal.WaitUntilReadyAsync();

        using var client = new HttpClient();
        using var page = await client.GetAsync($"http://localhost:{installation.Port}/", TestContext.Current.CancellationToken);
        Assert.Equal(HttpStatusCode.OK, page.StatusCode);
        Assert.Contains($"http://localhost:{installation.Port}", portal.Output, StringComparison.Ordinal);
        Assert.All(Directory.GetFiles(Path.Combine(installation.DataFolder, "secrets")), secret => Assert.Equal(OwnerOnly, File.GetUnixFileMode(secret)));
        AssertOnlyKnowsRole("PathPortal.Web.dll", "pathportal_web");
        AssertOnlyKnowsRole("PathPortal.Worker.dll", "pathportal_worker");

        await portal.SignalAsync("TERM");

        Assert.Equal(128 + 15, await portal.WaitForExitAsync());
        Assert.Empty(installation.Processes());
    }

    [Fact]
    public async Task Run_CtrlCOnATerminal_LeavesNoProcess()
    {
        await using var portal = RunningPortal.StartOnTerminal(installation);
        await portal.WaitUntilReadyAsync();

        await portal.TypeAsync('\u0003');

        Assert.Equal(128 + 2, await portal.WaitForExitAsync());
        Assert.Empty(installation.Processes());
    }

    [Fact]
    public async Task Run_Killed_LeavesNoProcessAndStartsAgain()
    {
        await using (var killed = RunningPortal.Start(installation))
        {
            await killed.WaitUntilReadyAsync();
            await killed.SignalAsync("KILL");
            await killed.WaitForExitAsync();
        }

        // Started at once, into the last steps of the old one's children.
        await using var again = RunningPortal.Start(installation);
        await again.WaitUntilReadyAsync();
        await again.SignalAsync("INT");

        Assert.Equal(128 + 2, await again.WaitForExitAsync());
        // A killed script waits for nobody; its worker has a patience of its own for the run it computes.
        Assert.Empty(await installation.ProcessesAfterAsync(TimeSpan.FromMinutes(1), TestContext.Current.CancellationToken));
    }

    [Fact]
    public async Task Run_WorkerDies_SaysSoAndStopsEverything()
    {
        await using var portal = RunningPortal.Start(installation);
        await portal.WaitUntilReadyAsync();

        await RunningPortal.SignalAsync(ProcessId("PathPortal.Worker.dll"), "KILL");

        Assert.Equal(1, await portal.WaitForExitAsync());
        Assert.Contains("run: the worker stopped unexpectedly", portal.Output, StringComparison.Ordinal);
        Assert.Empty(installation.Processes());
    }

    [Fact]
    public async Task Run_DatabaseKilled_SaysSoAndStartsAgain()
    {
        await using (var broken = RunningPortal.Start(installation))
        {
            await broken.WaitUntilReadyAsync();
            await RunningPortal.SignalAsync(ProcessId("/postgres -D"), "KILL");
            Assert.Equal(1, await broken.WaitForExitAsync());
            Assert.Contains("run: the private database stopped unexpectedly", broken.Output, StringComparison.Ordinal);
        }

        await using var again = RunningPortal.Start(installation);
        await again.WaitUntilReadyAsync();
    }

    [Fact]
    public async Task Run_Twice_TheSecondNamesTheFolderInUse()
    {
        await using var first = RunningPortal.Start(installation);
        await first.WaitUntilReadyAsync();

        var second = await RefusedAsync(installation.DataFolder, Installation.FreePort());

        Assert.Equal($"run: another scripts/run is using the data folder {installation.DataFolder}", second);
    }

    [Fact]
    public async Task Run_PortInUse_SaysSoInOneLine()
    {
        using var taken = new TcpListener(IPAddress.Loopback, 0);
        taken.Start();
        var port = ((IPEndPoint)taken.LocalEndpoint).Port;

        Assert.Equal($"run: port {port} is in use; set PATHPORTAL_PORT to another one", await RefusedAsync(installation.DataFolder, port));
    }

    [Fact]
    public async Task Run_FolderThatCannotBeMade_SaysSoInOneLine()
    {
        // Not even root can make a folder there.
        var refusal = await RefusedAsync("/proc/pathportal", Installation.FreePort());

        Assert.Equal($"run: {Environment.UserName} can't write to the data folder /proc/pathportal; set PATHPORTAL_DATA to a folder where this is possible", refusal);
    }

    [Fact]
    public async Task Run_DiskFull_SaysSoInOneLine()
    {
        string[] privateMounts = ["--map-root-user", "--mount"];
        if ((await Command.RunAsync("unshare", [.. privateMounts, "true"])).ExitCode != 0)
            Assert.Skip("This account may not make a mount namespace, so there is no small disk to fill.");
        var small = Directory.CreateTempSubdirectory("pathportal-full-").FullName;
        try
        {
            var result = await Command.RunAsync(
                "unshare",
                [.. privateMounts, "sh", "-c", $"mount -t tmpfs -o size=8m none {small} && exec scripts/run"],
                Settings(small, Installation.FreePort()));

            Assert.Equal(1, result.ExitCode);
            Assert.Equal($"run: only 8 MB free in {small}; at least 300 MB are needed there", result.Error.Trim());
        }
        finally
        {
            Directory.Delete(small, recursive: true);
        }
    }

    private static Dictionary<string, string> Settings(string folder, int port) =>
        new() { ["PATHPORTAL_DATA"] = folder, ["PATHPORTAL_PORT"] = port.ToString(CultureInfo.InvariantCulture) };

    private static async Task<string> RefusedAsync(string folder, int port)
    {
        var result = await Command.RunAsync("scripts/run", [], Settings(folder, port));
        Assert.Equal(1, result.ExitCode);
        return result.Error.Trim();
    }

    private int ProcessId(string part)
    {
        var process = Assert.Single(installation.Processes(), process => process.Contains(part, StringComparison.Ordinal));
        return int.Parse(process.Split(' ')[0], CultureInfo.InvariantCulture);
    }

    private void AssertOnlyKnowsRole(string program, string role)
    {
        var environment = File.ReadAllText($"/proc/{ProcessId(program)}/environ");
        string[] others = [.. new[] { "pathportal_owner", "pathportal_web", "pathportal_worker" }.Where(other => other != role)];
        Assert.Contains($"Username={role};", environment, StringComparison.Ordinal);
        Assert.All(others, other => Assert.DoesNotContain(other, environment, StringComparison.Ordinal));
    }
}
