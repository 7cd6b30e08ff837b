using Microsoft.AspNetCore.Hosting;
using Microsoft.AspNetCore.Mvc.Testing;
using Microsoft.Extensions.Logging;
using PathPortal.TestSupport;

namespace PathPortal.Web.Tests.Support;

/// <summary>The web process on a database of its own, in this process.</summary>
public sealed class PortalSite : WebApplicationFactory<Program>
{
    private readonly Dictionary<string, string> _settings;

    public PortalSite(TestDatabase database, params (string Key, string Value)[] settings)
    {
        Database = database;
        _settings = settings.ToDictionary(s => s.Key, s => s.Value);
    }

    public TestDatabase Database { get; }

    public People People => field ??= new People(Services);

    public Visitor Visit() => new(CreateClient(new() { AllowAutoRedirect = false, HandleCookies = true }));

    protected override void ConfigureWebHost(IWebHostBuilder builder)
    {
        builder.UseEnvironment("Production");
        builder.UseStaticWebAssets();
        builder.UseSetting("ConnectionStrings:Portal", Database.Web);
        // Tests sign in more often within a minute than a person; the tests of the limit set their own.
        builder.UseSetting("SignIn:PostsPerMinute", "10000");
        foreach (var (key, value) in _settings)
            builder.UseSetting(key, value);
        builder.ConfigureLogging(logging => logging.ClearProviders());
    }
}
