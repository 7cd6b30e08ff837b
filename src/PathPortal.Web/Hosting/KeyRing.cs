using Microsoft.AspNetCore.DataProtection;

namespace PathPortal.Web.Hosting;

/// <summary>
/// The keys that protect sign-in cookies and forms. <c>DataProtection:Folder</c> says where they are kept: the same folder for every web
/// process of one portal, outside the database, so that a copy of the database alone opens nothing.
/// </summary>
public static class KeyRing
{
    public static IServiceCollection AddPortalKeys(this IServiceCollection services, IConfiguration configuration)
    {
        // The name keeps processes started from different folders in one ring.
        var keys = services.AddDataProtection().SetApplicationName("PathPortal");
        if (configuration["DataProtection:Folder"] is { Length: > 0 } folder)
            keys.PersistKeysToFileSystem(new DirectoryInfo(folder));
        return services;
    }
}
