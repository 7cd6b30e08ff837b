using System.Collections.Concurrent;
using System.Diagnostics;
using System.Globalization;

namespace PathPortal.TestSupport;

/// <summary>A real worker process that can be killed, frozen and asked to end.</summary>
public sealed class WorkerProcess : IDisposable
{
    private readonly Process _process;
    private readonly ConcurrentQueue<string> _log = new();

    private WorkerProcess(Process process)
    {
        _process = process;
        process.OutputDataReceived += (_, line) => _log.Enqueue(line.Data ?? "");
        process.ErrorDataReceived += (_, line) => _log.Enqueue(line.Data ?? "");
        process.BeginOutputReadLine();
        process.BeginErrorReadLine();
    }

    public string Log => string.Join('\n', _log);

    public int Id => _process.Id;

    /// <summary>How this process appears in the names of workers.</summary>
    public string NamePart => string.Create(CultureInfo.InvariantCulture, $"/{Id}/");

    public bool HasExited => _process.HasExited;

    public int ExitCode => _process.ExitCode;

    public static WorkerProcess Start(string connectionString)
    {
        // The same configuration this test was built in: …/bin/<configuration>/<framework>/.
        var output = new DirectoryInfo(AppContext.BaseDirectory);
        var folder = Path.Combine(
            TestPaths.RepositoryRoot, "src", "PathPortal.Worker", "bin", output.Parent!.Name, output.Name);
        var start = new ProcessStartInfo("dotnet", [Path.Combine(folder, "PathPortal.Worker.dll"), "--contentRoot", folder])
        {
            RedirectStandardOutput = true,
            RedirectStandardError = true,
            Environment = { ["ConnectionStrings__Portal"] = connectionString },
        };
        return new(Process.Start(start)!);
    }

    public void KillAtOnce() => Send("KILL");

    public void FreezeNow() => Send("STOP");

    public void Thaw() => Send("CONT");

    public void AskToEnd() => Send("TERM");

    public Task WaitForExitAsync(CancellationToken cancellation) => _process.WaitForExitAsync(cancellation);

    public void Dispose()
    {
        if (!_process.HasExited)
        {
            Send("KILL");
            _process.WaitForExit();
        }
        _process.Dispose();
    }

    private void Send(string signal)
    {
        using var kill = Process.Start("kill", ["-" + signal, Id.ToString(CultureInfo.InvariantCulture)]);
        kill.WaitForExit();
        if (kill.ExitCode != 0)
            throw new InvalidOperationException($"Signal {signal} did not reach process {Id}.");
    }
}
