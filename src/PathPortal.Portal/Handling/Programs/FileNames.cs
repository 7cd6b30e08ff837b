using PathPortal.Formats.Problems;
using PathPortal.Portal.Domain;

namespace PathPortal.Portal.Handling.Programs;

/// <summary>Names of uploaded files, as they are shown and offered for download again.</summary>
internal static class FileNames
{
    private const int MaxLength = 200;

    /// <summary>The name without any folder, or why it can't be used.</summary>
    public static Outcome<string> Parse(string? text)
    {
        // Browsers of other systems send their own separators.
        var name = (text ?? "").Split('/', '\\')[^1].Trim();
        if (name.Length == 0)
            return new Refusal(RefusalKind.Invalid, "The file has no name.");
        if (name.Length > MaxLength)
            return new Refusal(RefusalKind.Invalid, $"The file's name has {name.Length} characters; at most {MaxLength} fit.");
        return VisibleText.FirstHidden(name) >= 0
            ? new Refusal(RefusalKind.Invalid, $"The file's name “{VisibleText.Of(name)}” holds a control or direction character.")
            : name;
    }
}
