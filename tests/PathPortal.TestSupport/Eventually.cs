namespace PathPortal.TestSupport;

/// <summary>Waits for something to become true by looking again and again.</summary>
public static class Eventually
{
    private static readonly TimeSpan Pause = TimeSpan.FromMilliseconds(50);

    /// <summary>Looks until <paramref name="look"/> gives something; fails after <paramref name="patience"/>, which is far beyond what is promised.</summary>
    public static async Task<T> GetAsync<T>(string what, TimeSpan patience, Func<Task<T?>> look, CancellationToken cancellation)
        where T : class
    {
        using var timer = new PeriodicTimer(Pause);
        var started = TimeProvider.System.GetTimestamp();
        while (true)
        {
            if (await look() is { } found)
                return found;
            if (TimeProvider.System.GetElapsedTime(started) > patience)
                throw new TimeoutException($"Not within {patience.TotalSeconds} s: {what}.");
            await timer.WaitForNextTickAsync(cancellation);
        }
    }

    public static Task TrueAsync(string what, TimeSpan patience, Func<Task<bool>> look, CancellationToken cancellation) =>
        GetAsync(what, patience, async () => await look() ? "yes" : null, cancellation);
}
