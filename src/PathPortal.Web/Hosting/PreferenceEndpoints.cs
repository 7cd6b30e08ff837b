using Microsoft.AspNetCore.Mvc;

namespace PathPortal.Web.Hosting;

public static class PreferenceEndpoints
{
    public static void MapPreferences(this IEndpointRouteBuilder routes) =>
        routes.MapPost("/preferences/theme", (HttpContext context, [FromForm] string? theme, [FromForm] string? returnUrl) =>
        {
            ThemeChoice.Write(context, theme ?? ThemeChoice.System);
            return Results.LocalRedirect(LocalPath.Or(returnUrl));
        }).AllowAnonymous();
}
