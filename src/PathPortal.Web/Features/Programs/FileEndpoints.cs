using System.Globalization;
using Microsoft.AspNetCore.Http.HttpResults;
using PathPortal.Portal.Data.Queries;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.Programs;
using PathPortal.Portal.Handling.Programs;
using PathPortal.Web.Hosting;

namespace PathPortal.Web.Features.Programs;

/// <summary>Files in and out, byte for byte.</summary>
public static class FileEndpoints
{
    public static void MapFiles(this IEndpointRouteBuilder routes)
    {
        routes.MapGet("/files/revision/{id:guid}", async (HttpContext context, Guid id, FileQuery files, CancellationToken cancellation) =>
            Answer(await files.RevisionAsync(CurrentActor.Of(context.User), id, cancellation)));
        routes.MapGet("/files/controller/{id:guid}", async (HttpContext context, Guid id, FileQuery files, CancellationToken cancellation) =>
            Answer(await files.ControllerFileAsync(CurrentActor.Of(context.User), id, cancellation)));
        routes.MapPost("/programs/{id:guid}/controller-files", AttachAsync);
    }

    // Always a download and never a page: the content is a stranger's.
    private static IResult Answer(Outcome<StoredFile> file) => file.Succeeded
        ? Results.File(file.Value.Bytes, "application/octet-stream", file.Value.FileName)
        : Results.StatusCode(file.Refusal.Kind == RefusalKind.NotAllowed ? StatusCodes.Status403Forbidden : StatusCodes.Status404NotFound);

    private static async Task<IResult> AttachAsync(
        HttpContext context, Guid id, AttachControllerFile attach, ProgramQuery programs, CancellationToken cancellation)
    {
        var form = await StreamedForm.ReadAsync(context, ControllerFile.MaxBytes, cancellation);
        if (form.Refused is { } status)
            return Results.StatusCode(status);
        if (!int.TryParse(form.Field("revision"), CultureInfo.InvariantCulture, out var number) || !Guid.TryParse(form.Field("cell"), out var cellId))
            return Results.StatusCode(StatusCodes.Status400BadRequest);
        var actor = CurrentActor.Of(context.User);
        var program = await programs.ReadAsync(actor, id, cancellation);
        if (!program.Succeeded)
            return Results.StatusCode(program.Refusal.Kind == RefusalKind.NotAllowed ? StatusCodes.Status403Forbidden : StatusCodes.Status404NotFound);
        var revision = program.Value.Revisions.FirstOrDefault(r => r.Number == number);
        var cell = program.Value.Assignments.FirstOrDefault(a => a.CellId == cellId && a.RetiredAt is null);
        if (revision is null || cell is null)
            return Results.StatusCode(StatusCodes.Status404NotFound);
        var done = await attach.HandleAsync(actor, revision.Id, cellId, form.FileName, form.File, cancellation);
        return done.Succeeded
            ? Results.LocalRedirect($"/programs/{id}?revision={number}")
            : new RazorComponentResult<AttachDocument>(new Dictionary<string, object?>
            {
                [nameof(AttachDocument.Program)] = program.Value,
                [nameof(AttachDocument.Revision)] = revision,
                [nameof(AttachDocument.Cell)] = cell,
                [nameof(AttachDocument.Refusal)] = done.Refusal,
            })
            { StatusCode = done.Refusal.Kind == RefusalKind.NotAllowed ? StatusCodes.Status403Forbidden : StatusCodes.Status422UnprocessableEntity };
    }
}
