using PathPortal.Portal.Data;

namespace PathPortal.Web.Hosting;

public static class HealthEndpoints
{
    private static readonly TimeSpan Patience = TimeSpan.FromSeconds(4);

    /// <summary>Live: the process answers. Ready: the database answers too and has the tables of this build.</summary>
    public static void MapHealth(this IEndpointRouteBuilder routes)
    {
        routes.MapGet("/health/live", () => Results.Text("live")).AllowAnonymous();
        routes.MapGet("/health/ready", async (PortalSchema schema, CancellationToken cancellation) =>
        {
            using var limit = CancellationTokenSource.CreateLinkedTokenSource(cancellation);
            limit.CancelAfter(Patience);
            string? problem;
            try
            {
                problem = await schema.WhyNotReadyAsync(limit.Token);
            }
            catch (OperationCanceledException) when (!cancellation.IsCancellationRequested)
            {
                problem = "The database does not answer in time.";
            }
            return problem is null ? Results.Text("ready") : Results.Text(problem, statusCode: StatusCodes.Status503ServiceUnavailable);
        }).AllowAnonymous();
    }
}
