namespace PathPortal.Formats.Paths;

/// <summary>Free text as one cell: no spreadsheet formula, quoted where RFC 4180 asks for it or blanks would be lost.</summary>
internal static class CsvText
{
    public static string Cell(string text)
    {
        var safe = PathLabel.Write(text);
        return safe.AsSpan().IndexOfAny(",\"\r\n") >= 0 || safe.Trim().Length != safe.Length
            ? "\"" + safe.Replace("\"", "\"\"", StringComparison.Ordinal) + "\""
            : safe;
    }
}
