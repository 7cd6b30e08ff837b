using Microsoft.AspNetCore.ResponseCompression;
using PathPortal.Portal.Data;
using PathPortal.Portal.Data.Queries;
using PathPortal.Portal.Handling;
using PathPortal.Portal.Jobs;
using PathPortal.Web.Features.Arms;
using PathPortal.Web.Features.Cells;
using PathPortal.Web.Features.Programs;
using PathPortal.Web.Features.Runs;
using PathPortal.Web.Features.SignIn;
using PathPortal.Web.Hosting;
using PathPortal.Web.Layout;

var builder = WebApplication.CreateBuilder(args);
var services = builder.Services;

services.AddSingleton(TimeProvider.System);
services.AddHttpContextAccessor();
services.AddRazorComponents().AddInteractiveServerComponents();
services.AddCascadingAuthenticationState();
services.AddAntiforgery(options => options.Cookie.SecurePolicy = CookieSecurePolicy.SameAsRequest);
services.AddPortalKeys(builder.Configuration);
services.AddPortalRateLimits(builder.Configuration);
services.AddResponseCompression(options =>
{
    // Files only: pages carry tokens, and compressing those beside text a stranger can choose would leak them.
    options.EnableForHttps = true;
    options.MimeTypes = ["text/css", "text/javascript", "application/javascript", "image/svg+xml", "application/vnd.pathportal.samples"];
    options.Providers.Add<BrotliCompressionProvider>();
    options.Providers.Add<GzipCompressionProvider>();
});
services.AddPortalData(builder.Configuration.GetConnectionString("Portal")
    ?? throw new InvalidOperationException("No database is configured: set the connection string named Portal (ConnectionStrings__Portal)."));
services.AddPortalSignIn();
services.AddScoped<CurrentActor>();
services.AddScoped<SignInHandler>();
services.AddRunQueue();
services.AddPortalHandlers();
services.AddPortalQueries();
services.AddRunSamples();

var app = builder.Build();

app.UseSecurityHeaders();
app.UseResponseCompression();
app.UseFailurePages();
app.UseRouting();
app.UseAuthentication();
app.UseAuthorization();
app.UseRateLimiter();
app.UseAntiforgery();

app.MapStaticAssets().AllowAnonymous().WithMetadata(new StaticFileMark());
app.MapHealth();
app.MapPreferences();
app.MapSignOut();
app.MapRevisionCells();
app.MapArmFiles();
app.MapCellFiles();
app.MapUpload();
app.MapFiles();
app.MapRuns();
app.MapRazorComponents<App>().AddInteractiveServerRenderMode();

await app.RunAsync();

public sealed partial class Program;
