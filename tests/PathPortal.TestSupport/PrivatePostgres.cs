using System.Diagnostics;

namespace PathPortal.TestSupport;

/// <summary>
/// A PostgreSQL server of one test's own, for tests that stop, kill or restart it. Tests that only need a database use
/// <see cref="TestDatabase"/>, which shares one server.
/// </summary>
public sealed class PrivatePostgres : IAsyncDisposable
{
    private readonly Process _keeper;

    private PrivatePostgres(Process keeper, string connectionString)
    {
        _keeper = keeper;
        ConnectionString = connectionString;
    }

    /// <summary>The superuser's connection to the database <c>postgres</c>. The port stays the same across stops and starts.</summary>
    public string ConnectionString { get; }

    /// <summary>Makes a fresh cluster and starts it, installing the server's package first where that is possible and necessary.</summary>
    public static async Task<PrivatePostgres> StartAsync(CancellationToken cancellationToken = default)
    {
        // The keeper ends, and the server with it, when our end of its standard input closes: at the latest when this process dies.
        var start = new ProcessStartInfo(Path.Combine(TestPaths.RepositoryRoot, "scripts", "lib", "private-postgres"))
        {
            RedirectStandardInput = true,
            RedirectStandardOutput = true,
        };
        var keeper = Process.Start(start)!;
        var line = await keeper.StandardOutput.ReadLineAsync(cancellationToken);
        if (line is null)
        {
            keeper.Dispose();
            throw new InvalidOperationException("PostgreSQL for the tests did not start; the reason is on standard error.");
        }

        return new PrivatePostgres(keeper, line);
    }

    /// <summary>Orderly shutdown: sessions are cut off, everything is written.</summary>
    public Task StopAsync(CancellationToken cancellationToken = default) => SayAsync("stop", cancellationToken);

    /// <summary>Kills the server without warning, as a power cut would seen from its clients.</summary>
    public Task KillAsync(CancellationToken cancellationToken = default) => SayAsync("kill", cancellationToken);

    /// <summary>Starts the same cluster again after <see cref="StopAsync"/> or <see cref="KillAsync"/>.</summary>
    public Task StartAgainAsync(CancellationToken cancellationToken = default) => SayAsync("start", cancellationToken);

    public async ValueTask DisposeAsync()
    {
        _keeper.StandardInput.Close();
        await _keeper.WaitForExitAsync();
        _keeper.Dispose();
    }

    private async Task SayAsync(string word, CancellationToken cancellationToken)
    {
        await _keeper.StandardInput.WriteLineAsync(word.AsMemory(), cancellationToken);
        await _keeper.StandardInput.FlushAsync(cancellationToken);
        if (await _keeper.StandardOutput.ReadLineAsync(cancellationToken) != "done")
            throw new InvalidOperationException($"PostgreSQL for the tests did not obey '{word}'; the reason is on standard error.");
    }
}
