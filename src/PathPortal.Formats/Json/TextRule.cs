using PathPortal.Formats.Problems;

namespace PathPortal.Formats.Json;

/// <summary>What a text may hold: a length, no hidden characters, for names no blanks at the ends.</summary>
internal sealed record TextRule(int Least, int Most, bool Lines)
{
    public static TextRule Name { get; } = new(1, 80, false);

    public static TextRule Source { get; } = new(1, 200, false);

    public static TextRule Line { get; } = new(0, 400, false);

    public static TextRule Note { get; } = new(0, Documents.ArmDocument.MostNoteCharacters, true);

    public string Expected => (Least > 0 ? $"{Least} to {Most} characters" : $"at most {Most} characters")
        + (Lines ? " without hidden characters" : " on one line without hidden characters, no blanks at the ends");

    /// <summary>What is wrong with the text, or null.</summary>
    public string? Fault(string? text)
    {
        if (text is null || text.Length < Least)
        {
            return "The text is missing.";
        }

        if (text.Length > Most)
        {
            return "The text is too long.";
        }

        if (VisibleText.FirstHidden(text, Lines) >= 0)
        {
            return "The text holds a control, direction or other hidden character.";
        }

        return !Lines && text.Length != text.Trim().Length ? "The text begins or ends with a blank." : null;
    }
}
