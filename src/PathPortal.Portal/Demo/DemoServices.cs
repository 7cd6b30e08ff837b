using Microsoft.AspNetCore.Identity;
using Microsoft.Extensions.DependencyInjection;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain.People;

namespace PathPortal.Portal.Demo;

/// <summary>Registers the loader of the demo.</summary>
public static class DemoServices
{
    /// <summary>Needs AddPortalData, AddRunQueue and AddPortalHandlers.</summary>
    public static IServiceCollection AddDemo(this IServiceCollection services) => services
        .AddSingleton<IPasswordHasher<Account>>(_ => PortalData.CreateHasher())
        .AddSingleton<DemoDefinitions>()
        .AddSingleton<DemoUploads>()
        .AddScoped<DemoLoader>();
}
