namespace PathPortal.Web.Hosting;

/// <summary>Light, dark, or what the system says; kept in a cookie so that the first byte of a page is already right.</summary>
public static class ThemeChoice
{
    public const string System = "system";
    private const string CookieName = "pathportal.theme";

    public static IReadOnlyList<string> All { get; } = [System, "light", "dark"];

    public static string Label(string choice) => choice switch { "light" => "Light", "dark" => "Dark", _ => "As the system" };

    /// <summary>"light", "dark" or null. Anything else in the cookie is ignored.</summary>
    public static string? Read(HttpContext context) => context.Request.Cookies[CookieName] is "light" or "dark" ? context.Request.Cookies[CookieName] : null;

    public static void Write(HttpContext context, string choice)
    {
        if (choice is "light" or "dark")
            context.Response.Cookies.Append(CookieName, choice, new CookieOptions
            {
                HttpOnly = true,
                SameSite = SameSiteMode.Lax,
                Secure = context.Request.IsHttps,
                MaxAge = TimeSpan.FromDays(365),
                IsEssential = true,
            });
        else
            context.Response.Cookies.Delete(CookieName);
    }
}
