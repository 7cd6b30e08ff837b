using Microsoft.AspNetCore.Http.HttpResults;
using PathPortal.Portal.Data.Queries;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.Runs;
using PathPortal.Portal.Simulation;
using PathPortal.Web.Features.Runs.Samples;
using PathPortal.Web.Hosting;

namespace PathPortal.Web.Features.Runs;

/// <summary>What the run page's scripts fetch. Every request asks anew whether the account may read the run.</summary>
public static class RunEndpoints
{
    public static void MapRuns(this IEndpointRouteBuilder routes)
    {
        var run = routes.MapGroup("/runs/{id:guid}");
        run.MapGet("/progress", ProgressAsync);
        run.MapGet("/samples/bins", BinsAsync);
        run.MapGet("/samples/scene", (HttpContext context, Guid id, RunQuery query, RunSampleCache cache, CancellationToken cancellation) =>
            SamplesAsync(context, id, query, cache, ScenePacker.Pack, cancellation));
        run.MapGet("/samples/window", (HttpContext context, Guid id, int? from, int? to, int bins, string names, RunQuery query, RunSampleCache cache, CancellationToken cancellation) =>
            SamplesAsync(context, id, query, cache, material => SampleAnswers.Window(material, from, to, bins, names), cancellation));
        run.MapGet("/samples/block", (HttpContext context, Guid id, int from, int count, RunQuery query, RunSampleCache cache, CancellationToken cancellation) =>
            SamplesAsync(context, id, query, cache, material => SampleAnswers.Block(material, from, count), cancellation));
    }

    private static async Task<IResult> SamplesAsync(
        HttpContext context, Guid id, RunQuery query, RunSampleCache cache, Func<RunMaterial, byte[]> pack, CancellationToken cancellation)
    {
        var progress = await query.ReadProgressAsync(CurrentActor.Of(context.User), id, cancellation);
        if (!progress.Succeeded)
            return Refused(progress.Refusal);
        if (progress.Value.State != RunState.Done)
            return Results.Conflict();
        var run = await cache.GetAsync(id, cancellation);
        return run.Succeeded
            ? Bytes(context, pack(new(run.Value.Scenario, run.Value.Samples)))
            : Results.Text(run.Refusal.Message, "text/plain", statusCode: StatusCodes.Status409Conflict);
    }

    private static async Task<IResult> BinsAsync(HttpContext context, Guid id, RunQuery query, CancellationToken cancellation)
    {
        var read = await query.ReadBinsAsync(CurrentActor.Of(context.User), id, cancellation);
        return read.Succeeded ? Bytes(context, SampleAnswers.Bins(UseBinsCodec.Unpack(read.Value))) : Refused(read.Refusal);
    }

    private static async Task<IResult> ProgressAsync(HttpContext context, Guid id, RunQuery query, CancellationToken cancellation)
    {
        var progress = await query.ReadProgressAsync(CurrentActor.Of(context.User), id, cancellation);
        if (!progress.Succeeded)
            return Refused(progress.Refusal);
        context.Response.Headers["X-Under-Way"] = progress.Value.IsUnderWay ? "yes" : "no";
        context.Response.Headers.CacheControl = "no-store";
        return new RazorComponentResult<RunUnderWay>(new Dictionary<string, object?> { [nameof(RunUnderWay.Progress)] = progress.Value });
    }

    private static IResult Bytes(HttpContext context, byte[] bytes)
    {
        context.Response.Headers.CacheControl = "private, no-store";
        return Results.Bytes(bytes, PackedSamples.ContentType);
    }

    // What the account may not read does not exist for it.
    private static IResult Refused(Refusal refusal) =>
        refusal.Kind == RefusalKind.NotFound ? Results.NotFound() : Results.StatusCode(StatusCodes.Status403Forbidden);
}
