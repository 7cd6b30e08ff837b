using Microsoft.AspNetCore.WebUtilities;
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

    private static async Task<IResult> AttachAsync(HttpContext context, Guid id, AttachControllerFile attach, CancellationToken cancellation)
    {
        var form = await StreamedForm.ReadAsync(context, ControllerFile.MaxBytes, cancellation);
        if (form.Refused is { } status)
            return Results.StatusCode(status);
        if (!Guid.TryParse(form.Field("revision"), out var revision) || !Guid.TryParse(form.Field("cell"), out var cell) || !int.TryParse(form.Field("number"), out var number))
            return Results.StatusCode(StatusCodes.Status400BadRequest);
        var done = await attach.HandleAsync(CurrentActor.Of(context.User), revision, cell, form.FileName, form.File, cancellation);
        if (done.Succeeded)
            return Results.LocalRedirect($"/programs/{id}?revision={number}");
        return done.Refusal.Kind switch
        {
            RefusalKind.NotFound => Results.StatusCode(StatusCodes.Status404NotFound),
            RefusalKind.NotAllowed => Results.StatusCode(StatusCodes.Status403Forbidden),
            _ => Results.LocalRedirect(QueryHelpers.AddQueryString($"/programs/{id}/attach", new Dictionary<string, string?>
            {
                ["revision"] = form.Field("number"),
                ["cell"] = form.Field("cell"),
                ["problem"] = done.Refusal.Message,
            })),
        };
    }
}
