using System.Data.Common;
using Microsoft.Extensions.Logging;

namespace PathPortal.Portal.Jobs;

/// <summary>
/// Repeats work that failed because the database could not be reached, so that a restart of it does not cost a result that is already
/// computed. Other failures pass through.
/// </summary>
internal sealed partial class DatabasePatience(TimeProvider clock, ILogger<DatabasePatience> log)
{
    /// <summary>After this the run is left to the reconciler.</summary>
    private static readonly TimeSpan Patience = TimeSpan.FromMinutes(5);

    private static readonly TimeSpan LongestPause = TimeSpan.FromSeconds(2);

    public async Task<T> TryAsync<T>(Func<Task<T>> work, CancellationToken cancellation)
    {
        var started = clock.GetTimestamp();
        for (var pause = TimeSpan.FromMilliseconds(100); ; pause *= 2)
        {
            try
            {
                return await work();
            }
            catch (Exception e) when (IsOutage(e) && clock.GetElapsedTime(started) < Patience)
            {
                LogOutage(e.Message);
                await Task.Delay(pause < LongestPause ? pause : LongestPause, clock, cancellation);
            }
        }
    }

    /// <summary>True for a connection that broke or could not be made, and for a server that is starting or stopping.</summary>
    public static bool IsOutage(Exception e)
    {
        for (var inner = (Exception?)e; inner is not null; inner = inner.InnerException)
        {
            if (inner is DbException { IsTransient: true } or TimeoutException)
                return true;
            // Connection exceptions, too many connections, shutdown of the server or of the connection, crash, still starting.
            if (inner is DbException { SqlState: { } state } && (state.StartsWith("08", StringComparison.Ordinal) || state is "53300" or "57P01" or "57P02" or "57P03"))
                return true;
        }
        return false;
    }

    [LoggerMessage(Level = LogLevel.Warning, Message = "The database does not answer; trying again: {Reason}")]
    private partial void LogOutage(string reason);
}
