using System.Net.Mime;
using System.Security.Claims;
using System.Text;
using PathPortal.Portal.Data.Queries;
using PathPortal.Portal.Domain;
using PathPortal.Web.Hosting;

namespace PathPortal.Web.Features.Arms;

/// <summary>The document of an arm version as a file, byte for byte what its digest covers.</summary>
internal static class ArmFileEndpoint
{
    public static void MapArmFiles(this IEndpointRouteBuilder routes) =>
        routes.MapGet("/arms/{id:guid}/file", async (Guid id, int? version, ArmsQuery query, ClaimsPrincipal user, CancellationToken cancellation) =>
        {
            var read = await query.ReadAsync(CurrentActor.Of(user), id, version, cancellation);
            return read.Succeeded
                ? Results.File(Encoding.UTF8.GetBytes(read.Value.Json), MediaTypeNames.Application.Json, $"arm-{id:N}-version-{read.Value.Shown.Number}.json")
                : Results.StatusCode(read.Refusal.Kind == RefusalKind.NotFound ? StatusCodes.Status404NotFound : StatusCodes.Status403Forbidden);
        });
}
