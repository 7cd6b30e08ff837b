namespace PathPortal.Formats.Paths;

/// <summary>Says why a text is not a number one can use.</summary>
internal static class NumberFault
{
    public static string Of(string text)
    {
        var bare = text.TrimStart('+', '-');
        if (bare.Equals("nan", StringComparison.OrdinalIgnoreCase) || bare.StartsWith("inf", StringComparison.OrdinalIgnoreCase) || bare == "∞")
        {
            return "The value is not a finite number.";
        }

        if (bare.Length > 0 && bare.All(c => char.IsAsciiDigit(c) || c is ',' or '.') && bare.Contains(',', StringComparison.Ordinal))
        {
            return "The number has a comma; only a decimal point is read, and no thousands marks.";
        }

        return double.TryParse(text, System.Globalization.NumberStyles.Float, System.Globalization.CultureInfo.InvariantCulture, out var value)
            && !double.IsFinite(value)
            ? "The number is too large."
            : "This is not a number.";
    }
}
