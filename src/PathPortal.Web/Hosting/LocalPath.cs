namespace PathPortal.Web.Hosting;

/// <summary>Only a path of this portal may follow a form post; anything else becomes the start page.</summary>
public static class LocalPath
{
    public static string Or(string? path, string otherwise = "/") => IsLocal(path) ? path! : otherwise;

    private static bool IsLocal(string? path) =>
        path is ['/', ..] and not ['/', '/' or '\\', ..] && !path.Any(char.IsControl);
}
