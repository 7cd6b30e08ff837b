using Microsoft.AspNetCore.Builder;
using Microsoft.AspNetCore.Components;
using Microsoft.AspNetCore.Components.Rendering;
using Microsoft.AspNetCore.Hosting;
using Microsoft.AspNetCore.Http;
using Microsoft.AspNetCore.ResponseCompression;
using Microsoft.Extensions.DependencyInjection;
using Microsoft.Extensions.Logging;
using PathPortal.Engine.Verdicts;
using PathPortal.TestSupport.Runs;
using PathPortal.Web.Features.Runs;
using PathPortal.Web.Features.Runs.Samples;
using PathPortal.Web.Hosting;
using PathPortal.Web.Layout;

namespace PathPortal.Browser.Tests.Runs;

/// <summary>
/// The report of one invented run on loopback, with the portal's own components, scripts, styles and headers but no database: for what the
/// page does with samples, whatever they are.
/// </summary>
public sealed class RunReportHost : IAsyncDisposable
{
    private readonly WebApplication _app;

    private RunReportHost(WebApplication app, InventedRun run, RunView view) => (_app, Run, View) = (app, run, view);

    public InventedRun Run { get; }

    public RunView View { get; }

    public Uri Address => new(new Uri(_app.Urls.First()), View.Href);

    public static async Task<RunReportHost> StartAsync(InventedRun run, Action<WebApplication>? first = null)
    {
        var builder = WebApplication.CreateBuilder(new WebApplicationOptions
        {
            ApplicationName = typeof(RunReport).Assembly.GetName().Name,
            ContentRootPath = AppContext.BaseDirectory,
            EnvironmentName = "Development",
        });
        builder.WebHost.UseStaticWebAssets();
        builder.WebHost.UseUrls("http://127.0.0.1:0");
        builder.Logging.ClearProviders();
        builder.Services.AddSingleton(TimeProvider.System);
        builder.Services.AddHttpContextAccessor();
        builder.Services.AddRazorComponents().AddInteractiveServerComponents();
        builder.Services.AddResponseCompression(options => options.MimeTypes = ["text/css", "text/javascript", PackedSamples.ContentType]);
        var view = ViewOf(run);
        builder.Services.AddSingleton(view);

        var app = builder.Build();
        first?.Invoke(app);
        app.UseSecurityHeaders();
        app.UseResponseCompression();
        app.UseAntiforgery();
        app.MapStaticAssets();
        var material = new RunMaterial(run.Scenario, run.Samples);
        var samples = app.MapGroup($"{view.Href}/samples");
        samples.MapGet("/bins", () => Bytes(SampleAnswers.Bins(run.Bins)));
        samples.MapGet("/scene", () => Bytes(ScenePacker.Pack(material)));
        samples.MapGet("/window", (int? from, int? to, int bins, string names) => Bytes(SampleAnswers.Window(material, from, to, bins, names)));
        samples.MapGet("/block", (int from, int count) => Bytes(SampleAnswers.Block(material, from, count)));
        app.MapRazorComponents<Root>().AddInteractiveServerRenderMode().AddAdditionalAssemblies(typeof(RunReport).Assembly);
        await app.StartAsync();
        return new(app, run, view);
    }

    public async ValueTask DisposeAsync()
    {
        await _app.StopAsync();
        await _app.DisposeAsync();
    }

    private static IResult Bytes(byte[] bytes) => Results.Bytes(bytes, PackedSamples.ContentType);

    private static RunView ViewOf(InventedRun run)
    {
        const string digest = "5f0c1be44d7a39f2a6b08c2d9e71f3580a4c6e9b12d7f8035c9ae46b7d201f83";
        return new()
        {
            Id = new("0198c0de-0000-7000-8000-000000000001"),
            Sentence = VerdictSentence.Of(run.Summary.Verdict, run.Summary.Outcomes),
            Summary = run.Summary,
            Bins = run.Bins,
            Arm = run.Scenario.Arm,
            Criteria = run.Scenario.Criteria,
            Inputs = new()
            {
                Program = new("Hatch seam", "/programs/1"),
                Revision = new("revision 2", "/revisions/1", digest),
                Cell = new("North 3", "/cells/1"),
                Setup = new("setup 4", "/cells/1", digest),
                Arm = new("Heron 12, version 1", "/arms/1", digest),
                Criteria = new("Sealing, version 3", "/criteria/1", digest),
                Plant = "Lakeside",
                Zone = "Europe/Berlin",
                Tool = "nozzle 2 mm",
                WorkFrame = "hatch fixture",
                Digest = digest,
                NumericsVersion = 1,
                FinishedAt = new(2026, 3, 4, 9, 30, 0, TimeSpan.Zero),
                Worker = "worker-1",
            },
        };
    }

    /// <summary>The document around the report.</summary>
    [Route("/{**path}")]
    public sealed class Root : ComponentBase
    {
        [Inject]
        private RunView View { get; set; } = null!;

        protected override void BuildRenderTree(RenderTreeBuilder builder)
        {
            builder.OpenComponent<Document>(0);
            builder.AddAttribute(1, nameof(Document.ChildContent), (RenderFragment)(body =>
            {
                body.OpenElement(0, "main");
                body.AddAttribute(1, "class", "page");
                body.OpenComponent<RunReportPage>(2);
                body.AddAttribute(3, nameof(RunReportPage.Run), View);
                body.CloseComponent();
                body.CloseElement();
            }));
            builder.CloseComponent();
        }
    }
}
