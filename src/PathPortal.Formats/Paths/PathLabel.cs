namespace PathPortal.Formats.Paths;

/// <summary>
/// Labels in files. A spreadsheet takes a cell that begins with = + - @ for a formula; such labels are written with an apostrophe in front,
/// and reading takes it away, so that no label changes on the way.
/// </summary>
public static class PathLabel
{
    public const int MostCharacters = 200;

    /// <summary>The label of a cell.</summary>
    public static string Read(string cell)
    {
        ArgumentNullException.ThrowIfNull(cell);
        return cell.StartsWith('\'') && LooksLikeFormula(cell.TrimStart('\'')) ? cell[1..] : cell;
    }

    /// <summary>The label for a cell, before quoting.</summary>
    public static string Write(string label)
    {
        ArgumentNullException.ThrowIfNull(label);
        return LooksLikeFormula(label.TrimStart('\'')) ? "'" + label : label;
    }

    // Blanks and tabs in front don't stop a spreadsheet.
    private static bool LooksLikeFormula(string text) => text.TrimStart() is ['=' or '+' or '-' or '@', ..] || text is ['\t' or '\r' or '\n', ..];
}
