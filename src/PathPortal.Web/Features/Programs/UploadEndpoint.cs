using Microsoft.AspNetCore.Http.HttpResults;
using PathPortal.Formats.Paths;
using PathPortal.Formats.Problems;
using PathPortal.Portal.Data.Queries;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Handling.Programs;
using PathPortal.Web.Hosting;

namespace PathPortal.Web.Features.Programs;

public static class UploadEndpoint
{
    public static void MapUpload(this IEndpointRouteBuilder routes)
    {
        routes.MapPost("/programs/{id:guid}/revisions", UploadAsync);
        routes.MapGet("/examples/" + PathExample.FileName, () =>
            Results.File(System.Text.Encoding.UTF8.GetBytes(PathExample.Text), "text/csv", PathExample.FileName)).AllowAnonymous();
    }

    private static async Task<IResult> UploadAsync(HttpContext context, Guid id, UploadRevision upload, ProgramQuery programs, CancellationToken cancellation)
    {
        var actor = CurrentActor.Of(context.User);
        var form = await StreamedForm.ReadAsync(context, ReadLimits.PathBytes, cancellation);
        if (form.Refused is { } status)
            return Results.StatusCode(status);
        var result = await upload.HandleAsync(actor, id, form.FileName, form.File, form.Field("note"), cancellation);
        if (result.Succeeded)
            return Results.LocalRedirect($"/programs/{id}?revision={result.Revision.Number}");
        var program = await programs.ReadAsync(actor, id, cancellation);
        if (!program.Succeeded || result.Refusal.Kind is RefusalKind.NotFound or RefusalKind.NotAllowed)
            return Results.StatusCode(result.Refusal.Kind == RefusalKind.NotAllowed ? StatusCodes.Status403Forbidden : StatusCodes.Status404NotFound);
        return new RazorComponentResult<UploadDocument>(new Dictionary<string, object?>
        {
            [nameof(UploadDocument.Program)] = program.Value,
            [nameof(UploadDocument.Refusal)] = result.Refusal,
            [nameof(UploadDocument.Problems)] = (IReadOnlyList<FormatProblem>)result.Problems,
            [nameof(UploadDocument.More)] = result.MoreProblems,
            [nameof(UploadDocument.FileName)] = VisibleText.Of(form.FileName),
            [nameof(UploadDocument.Note)] = form.Field("note"),
        })
        { StatusCode = StatusCodes.Status422UnprocessableEntity };
    }
}
