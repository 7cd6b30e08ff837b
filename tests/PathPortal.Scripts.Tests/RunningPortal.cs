using System.Collections.Concurrent;
using System.Diagnostics;
using System.Text;
using PathPortal.TestSupport;

namespace PathPortal.Scripts.Tests;

/// <summary>One start of <c>scripts/run</c>.</summary>
internal sealed class RunningPortal : IAsyncDisposable
{
    // A fresh clone builds first and a busy machine takes its time; nothing here is a measurement.
    private static readonly TimeSpan Patience = TimeSpan.FromMinutes(15);

    private static readonly string Script = Path.Combine(TestPaths.RepositoryRoot, "scripts", "run");

    private readonly ConcurrentQueue<string> _lines = new();
    private readonly TaskCompletionSource _ready = new(TaskCreationOptions.RunContinuationsAsynchronously);
    private readonly Process _process;

    private RunningPortal(Process process)
    {
        _process = process;
        process.OutputDataReceived += (_, line) => Take(line.Data);
        process.ErrorDataReceived += (_, line) => Take(line.Data);
        process.BeginOutputReadLine();
        process.BeginErrorReadLine();
    }

    public int Id => _process.Id;

    public string Output => string.Join('\n', _lines);

    public static RunningPortal Start(Installation at) => Launch(at, Script);

    /// <summary>Starts on a terminal of its own.</summary>
    public static RunningPortal StartOnTerminal(Installation at) =>
        Launch(at, "script", "--quiet", "--return", "--flush", "--command", Script, "/dev/null");

    /// <summary>Waits for the line that names the address; a start that ends before is a failure that shows what it said.</summary>
    public async Task WaitUntilReadyAsync()
    {
        var ended = _process.WaitForExitAsync(TestContext.Current.CancellationToken);
        await Task.WhenAny(_ready.Task, ended).WaitAsync(Patience, TestContext.Current.CancellationToken);
        Assert.True(_ready.Task.IsCompleted, $"scripts/run ended before it was ready:\n{Output}");
    }

    public async Task<int> WaitForExitAsync()
    {
        await _process.WaitForExitAsync(TestContext.Current.CancellationToken).WaitAsync(Patience, TestContext.Current.CancellationToken);
        return _process.ExitCode;
    }

    public Task SignalAsync(string signal) => SignalAsync(Id, signal);

    public static Task SignalAsync(int process, string signal) => Command.RunAsync("kill", [$"-{signal}", $"{process}"]);

    public async Task TypeAsync(char key)
    {
        await _process.StandardInput.WriteAsync(key);
        await _process.StandardInput.FlushAsync(TestContext.Current.CancellationToken);
    }

    public async ValueTask DisposeAsync()
    {
        if (!_process.HasExited)
        {
            await SignalAsync("TERM");
            await _process.WaitForExitAsync();
        }

        _process.Dispose();
    }

    private static RunningPortal Launch(Installation at, params string[] command)
    {
        // A test run that was itself started in the background would hand on INT as ignored, which no shell can undo.
        var start = new ProcessStartInfo("env", ["--default-signal=INT", .. command])
        {
            RedirectStandardInput = true,
            RedirectStandardOutput = true,
            RedirectStandardError = true,
            StandardOutputEncoding = Encoding.UTF8,
        };
        start.Environment["PATHPORTAL_DATA"] = at.DataFolder;
        start.Environment["PATHPORTAL_PORT"] = $"{at.Port}";
        return new RunningPortal(Process.Start(start)!);
    }

    private void Take(string? line)
    {
        if (line is null)
            return;
        _lines.Enqueue(line);
        if (line.Contains("PathPortal is ready", StringComparison.Ordinal))
            _ready.TrySetResult();
    }
}
