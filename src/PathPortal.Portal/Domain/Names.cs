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
        if (trimmed.Any(IsUnseen))
            return new Refusal(RefusalKind.Invalid, $"The name of the {what} holds a control or direction character.");
        return trimmed;
    }

    /// <summary>Trimmed note, possibly empty, or why it does not fit.</summary>
    public static Outcome<string> Note(string? text)
    {
        var trimmed = (text ?? "").Trim();
        if (trimmed.Length > MaxNote)
            return new Refusal(RefusalKind.Invalid, $"The note has {trimmed.Length} characters; at most {MaxNote} fit.");
        return trimmed.Any(c => IsUnseen(c) && c is not ('\n' or '\r' or '\t'))
            ? new Refusal(RefusalKind.Invalid, "The note holds a control or direction character.")
            : trimmed;
    }

    // Direction overrides can make a name read as another one.
    private static bool IsUnseen(char c) =>
        char.IsControl(c) || c is (>= '\u202A' and <= '\u202E') or (>= '\u2066' and <= '\u2069') or '\u200E' or '\u200F' or '\u2028' or '\u2029';
}
