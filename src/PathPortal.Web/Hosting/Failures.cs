using System.Net.Sockets;
using Microsoft.AspNetCore.Diagnostics;
using Npgsql;

namespace PathPortal.Web.Hosting;

/// <summary>What the error page may say about the exception that led there.</summary>
public static class Failures
{
    public static bool IsDatabaseDown(HttpContext context) =>
        context.Features.Get<IExceptionHandlerFeature>()?.Error is { } error && IsDatabaseDown(error);

    /// <summary>No answer from the database server, as opposed to an answer that says no.</summary>
    public static bool IsDatabaseDown(Exception error)
    {
        for (Exception? inner = error; inner is not null; inner = inner.InnerException)
            if (inner is PostgresException { SqlState: "57P01" or "57P02" or "57P03" or "53300" } or SocketException or TimeoutException
                || inner is NpgsqlException and not PostgresException)
                return true;
        return false;
    }

    public static string PathOf(HttpContext context) => LocalPath.Or(context.Features.Get<IExceptionHandlerPathFeature>()?.Path);
}
