using PathPortal.Formats.Problems;

namespace PathPortal.Portal.Domain;

/// <summary>Checks shared by everything that has a name or a note.</summary>
public static class Names
{
    public const int MaxName = 120;
    public const int MaxNote = 2000;

    /// <summary>Trimmed name, or why it is none.</summary>
    public static Outcome<string> Name(string? text, string what)
    {
        var trimmed = (text ?? "").Trim();
        if (trimmed.Length == 0)
            return new Refusal(RefusalKind.Invalid, $"The {what} needs a name.");
        if (trimmed.Length > MaxName)
            return new Refusal(RefusalKind.Invalid, $"The name of the {what} has {trimmed.Length} characters; at most {MaxName} fit.");
        if (VisibleText.FirstHidden(trimmed) >= 0)
            return new Refusal(RefusalKind.Invalid, $"The name of the {what} holds a control or direction character.");
        return trimmed;
    }

    /// <summary>Trimmed note, possibly empty, or why it does not fit.</summary>
    public static Outcome<string> Note(string? text)
    {
        var trimmed = (text ?? "").Trim().ReplaceLineEndings("\n");
        if (trimmed.Length > MaxNote)
            return new Refusal(RefusalKind.Invalid, $"The note has {trimmed.Length} characters; at most {MaxNote} fit.");
        return VisibleText.FirstHidden(trimmed, allowLineFeed: true) >= 0
            ? new Refusal(RefusalKind.Invalid, "The note holds a control or direction character.")
            : trimmed;
    }
}
