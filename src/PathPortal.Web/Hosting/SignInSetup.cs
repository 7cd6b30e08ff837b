using Microsoft.AspNetCore.Authentication.Cookies;
using Microsoft.AspNetCore.Authorization;
using Microsoft.AspNetCore.Diagnostics;
using Microsoft.AspNetCore.Identity;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain.People;

namespace PathPortal.Web.Hosting;

/// <summary>Accounts, the session cookie, and the rule that nothing is open to strangers unless it says so.</summary>
public static class SignInSetup
{
    public static IServiceCollection AddPortalSignIn(this IServiceCollection services)
    {
        services.AddIdentityCore<Account>(PortalData.ConfigureIdentity)
            .AddEntityFrameworkStores<PortalDbContext>()
            .AddSignInManager()
            .AddClaimsPrincipalFactory<AccountPrincipalFactory>();
        services.AddAuthentication(IdentityConstants.ApplicationScheme).AddIdentityCookies(cookies => cookies.ApplicationCookie!.Configure(ConfigureCookie));
        services.AddAuthorizationBuilder().SetFallbackPolicy(new AuthorizationPolicyBuilder().RequireAuthenticatedUser().Build());
        return services;
    }

    private static void ConfigureCookie(CookieAuthenticationOptions options)
    {
        options.Cookie.Name = "pathportal.session";
        options.Cookie.HttpOnly = true;
        options.Cookie.SameSite = SameSiteMode.Lax;
        options.Cookie.SecurePolicy = CookieSecurePolicy.SameAsRequest;
        options.ExpireTimeSpan = TimeSpan.FromHours(12);
        options.SlidingExpiration = true;
        options.LoginPath = "/sign-in";
        options.AccessDeniedPath = "/access-denied";
        options.ReturnUrlParameter = "returnUrl";
        options.Events.OnValidatePrincipal = ValidateAsync;
    }

    // A disabled account or a changed password ends open sessions at the next request, not after some minutes; handlers read the account again in any case.
    private static async Task ValidateAsync(CookieValidatePrincipalContext context)
    {
        if (NeedsNoAccount(context.HttpContext))
            return;
        var signIn = context.HttpContext.RequestServices.GetRequiredService<SignInManager<Account>>();
        if (await signIn.ValidateSecurityStampAsync(context.Principal) is { DisabledAt: null })
            return;
        context.RejectPrincipal();
        await signIn.SignOutAsync();
    }

    // Files and the error page itself must not need the database.

    private static bool NeedsNoAccount(HttpContext context) =>
        context.Features.Get<IExceptionHandlerFeature>() is not null
        || context.GetEndpoint()?.Metadata.GetMetadata<StaticFileMark>() is not null
        || context.Request.Path.StartsWithSegments("/health");
}
