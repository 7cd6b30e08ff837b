using System.Net;
using System.Net.Sockets;

namespace PathPortal.Scripts.Tests;

/// <summary>A data folder and a port that the tests of <c>scripts/run</c> share, so that only the first of them pays for making the database.</summary>
public sealed class Installation : IDisposable
{
    public Installation()
    {
        // World-readable, unlike the system's own temporary folders: a root's PostgreSQL runs as another account.
        DataFolder = Path.Combine("/tmp", $"pathportal-run-{Guid.NewGuid():N}"[..26]);
        Directory.CreateDirectory(DataFolder);
        Port = FreePort();
    }

    public string DataFolder { get; }

    public int Port { get; }

    public static int FreePort()
    {
        using var listener = new TcpListener(IPAddress.Loopback, 0);
        listener.Start();
        return ((IPEndPoint)listener.LocalEndpoint).Port;
    }

    /// <summary>The commands of all processes that belong to this installation, by their arguments or their working folder.</summary>
    public IReadOnlyList<string> Processes() => [.. Directory.GetDirectories("/proc").Select(Describe).OfType<string>()];

    /// <summary>What is still there after at most that long.</summary>
    public async Task<IReadOnlyList<string>> ProcessesAfterAsync(TimeSpan patience, CancellationToken cancellation)
    {
        var start = TimeProvider.System.GetTimestamp();
        using var look = new PeriodicTimer(TimeSpan.FromMilliseconds(200));
        while (Processes() is { Count: > 0 } left)
        {
            if (TimeProvider.System.GetElapsedTime(start) > patience)
                return left;
            await look.WaitForNextTickAsync(cancellation);
        }
        return [];
    }

    public void Dispose() => Directory.Delete(DataFolder, recursive: true);

    private string? Describe(string process)
    {
        if (!int.TryParse(Path.GetFileName(process), out var id) || id == Environment.ProcessId)
            return null;
        try
        {
            var command = File.ReadAllText(Path.Combine(process, "cmdline")).Replace('\0', ' ');
            var folder = new DirectoryInfo(Path.Combine(process, "cwd")).LinkTarget ?? "";
            var environment = File.ReadAllText(Path.Combine(process, "environ"));
            var belongs = command.Contains(DataFolder, StringComparison.Ordinal) || folder.StartsWith(DataFolder, StringComparison.Ordinal)
                || environment.Contains($"PATHPORTAL_DATA={DataFolder}", StringComparison.Ordinal);
            return belongs ? $"{id} {command}" : null;
        }
        catch (Exception gone) when (gone is IOException or UnauthorizedAccessException)
        {
            return null;
        }
    }
}
