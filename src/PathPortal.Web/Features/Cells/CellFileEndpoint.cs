using System.Net.Mime;
using System.Security.Claims;
using System.Text;
using PathPortal.Portal.Data.Queries;
using PathPortal.Web.Hosting;

namespace PathPortal.Web.Features.Cells;

/// <summary>The document of a setup as a file, byte for byte what its digest covers.</summary>
internal static class CellFileEndpoint
{
    public static void MapCellFiles(this IEndpointRouteBuilder routes) =>
        routes.MapGet("/cells/{id:guid}/file", async (Guid id, int? setup, CellsQuery query, ClaimsPrincipal user, CancellationToken cancellation) =>
        {
            var read = await query.ReadAsync(CurrentActor.Of(user), id, setup, cancellation);
            return read is { Succeeded: true, Value.Shown: { } shown }
                ? Results.File(Encoding.UTF8.GetBytes(shown.Json), MediaTypeNames.Application.Json, $"cell-{id:N}-setup-{shown.Version.Number}.json")
                : Results.NotFound();
        });
}
