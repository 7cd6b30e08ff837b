using Microsoft.AspNetCore.Http.HttpResults;
using PathPortal.Portal.Data.Queries;
using PathPortal.Web.Hosting;

namespace PathPortal.Web.Features.Programs;

public static class RevisionCellsEndpoint
{
    /// <summary>The table of a revision's cells alone, for the page that follows its runs.</summary>
    public static void MapRevisionCells(this IEndpointRouteBuilder routes) =>
        routes.MapGet("/programs/{id:guid}/revisions/{revisionId:guid}/cells", async (HttpContext context, Guid id, Guid revisionId, ProgramQuery query, CancellationToken cancellation) =>
        {
            var read = await query.ReadAsync(CurrentActor.Of(context.User), id, cancellation);
            var revision = read.Succeeded ? read.Value.Revisions.FirstOrDefault(r => r.Id == revisionId) : null;
            if (revision is null)
                return Results.NotFound();
            context.Response.Headers["X-Under-Way"] = read.Value.Figures.Any(f => f.RevisionId == revisionId && f.IsUnderWay) ? "yes" : "no";
            context.Response.Headers.CacheControl = "no-store";
            return new RazorComponentResult<RevisionCells>(new Dictionary<string, object?>
            {
                [nameof(RevisionCells.Program)] = read.Value,
                [nameof(RevisionCells.Revision)] = revision,
            });
        });
}
