using System.Net.Sockets;
using Microsoft.AspNetCore.Diagnostics;
using Microsoft.AspNetCore.Http.HttpResults;
using Npgsql;
using PathPortal.Web.Layout;

namespace PathPortal.Web.Hosting;

/// <summary>Honest pages for what goes wrong: exceptions, and statuses nothing else gave a body to.</summary>
public static class Failures
{
    public static IApplicationBuilder UseFailurePages(this IApplicationBuilder app) => app
        .UseExceptionHandler(new ExceptionHandlerOptions
        {
            CreateScopeForErrors = true,
            StatusCodeSelector = StatusOf,
            ExceptionHandler = context => RenderAsync(context, context.Response.StatusCode),
        })
        .UseStatusCodePages(async context =>
        {
            // The services of the request may have rendered already; a renderer serves one page.
            var http = context.HttpContext;
            var before = http.RequestServices;
            await using var scope = before.CreateAsyncScope();
            http.RequestServices = scope.ServiceProvider;
            try
            {
                await RenderAsync(http, http.Response.StatusCode);
            }
            finally
            {
                http.RequestServices = before;
            }
        });

    /// <summary>No answer from the database server, as opposed to an answer that says no.</summary>
    public static bool IsDatabaseDown(Exception error)
    {
        for (Exception? inner = error; inner is not null; inner = inner.InnerException)
        {
            // Shutting down, crashed, starting up, too many connections: the server's ways to say "not now".
            if (inner is PostgresException { SqlState: "57P01" or "57P02" or "57P03" or "53300" } or SocketException
                || inner is NpgsqlException and not PostgresException)
                return true;
        }
        return false;
    }

    private static int StatusOf(Exception error) => error switch
    {
        BadHttpRequestException bad => bad.StatusCode,
        _ when IsDatabaseDown(error) => StatusCodes.Status503ServiceUnavailable,
        _ => StatusCodes.Status500InternalServerError,
    };

    private static Task RenderAsync(HttpContext context, int status)
    {
        if (HttpMethods.IsHead(context.Request.Method))
            return Task.CompletedTask;
        var parameters = new Dictionary<string, object?>
        {
            [nameof(StatusDocument.Code)] = status,
            [nameof(StatusDocument.RequestNumber)] = status >= 500 ? context.TraceIdentifier : null,
            [nameof(StatusDocument.Again)] = HttpMethods.IsGet(context.Request.Method) && status is not (403 or 404) ? LocalPath.Or(context.Request.Path) : "/",
        };
        return new RazorComponentResult<StatusDocument>(parameters) { StatusCode = status }.ExecuteAsync(context);
    }
}
