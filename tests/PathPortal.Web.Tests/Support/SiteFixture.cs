using PathPortal.TestSupport;

namespace PathPortal.Web.Tests.Support;

/// <summary>Tests of one class share a site and its database.</summary>
public sealed class SiteFixture : IAsyncLifetime
{
    public PortalSite Site { get; private set; } = null!;

    public async ValueTask InitializeAsync() => Site = new PortalSite(await TestDatabase.CreateAsync());

    public async ValueTask DisposeAsync()
    {
        await Site.DisposeAsync();
        await Site.Database.DisposeAsync();
    }
}
