using System.Buffers;
using System.Globalization;

namespace PathPortal.Formats.Paths;

/// <summary>Numbers in cells: decimal point, optional exponent, nothing else, whatever the culture.</summary>
internal static class CellNumber
{
    private const NumberStyles Style = NumberStyles.AllowLeadingSign | NumberStyles.AllowDecimalPoint | NumberStyles.AllowExponent;

    private static readonly SearchValues<byte> Characters = SearchValues.Create("0123456789+-.eE"u8);

    /// <summary>The number times 10 to the power of <paramref name="shift"/>, rounded once: 123.4 mm is exactly what 0.1234 m is.</summary>
    /// <returns>False for text that is no finite decimal number.</returns>
    public static bool TryParse(ReadOnlySpan<byte> text, int shift, out double value)
    {
        value = 0;
        if (text.IsEmpty || text.Length > 400 || text.ContainsAnyExcept(Characters))
        {
            return false;
        }

        if (shift == 0)
        {
            return double.TryParse(text, Style, CultureInfo.InvariantCulture, out value) && double.IsFinite(value);
        }

        Span<byte> shifted = stackalloc byte[text.Length + 16];
        var mark = text.IndexOfAny((byte)'e', (byte)'E');
        var exponent = 0;
        if (mark >= 0 && !int.TryParse(text[(mark + 1)..], NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture, out exponent))
        {
            return false;
        }

        var digits = mark < 0 ? text : text[..mark];
        digits.CopyTo(shifted);
        shifted[digits.Length] = (byte)'e';
        if (!(exponent + (long)shift is > int.MinValue and < int.MaxValue)
            || !(exponent + shift).TryFormat(shifted[(digits.Length + 1)..], out var written, default, CultureInfo.InvariantCulture))
        {
            return false;
        }

        return double.TryParse(
            shifted[..(digits.Length + 1 + written)], Style, CultureInfo.InvariantCulture, out value) && double.IsFinite(value);
    }

    /// <summary>Shortest text that <see cref="TryParse"/> with the opposite shift reads back as the same number.</summary>
    public static string Text(double value, int shift)
    {
        var shortest = value.ToString("R", CultureInfo.InvariantCulture);
        if (shift == 0 || value == 0)
        {
            return value == 0 ? "0" : shortest;
        }

        // Digits of the shortest text, the decimal point moved by the shift.
        var negative = shortest[0] == '-';
        var body = shortest.TrimStart('-');
        var mark = body.IndexOf('E', StringComparison.Ordinal);
        var exponent = mark < 0 ? 0 : int.Parse(body[(mark + 1)..], NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture);
        body = mark < 0 ? body : body[..mark];
        var point = body.IndexOf('.', StringComparison.Ordinal);
        var digits = body.Replace(".", "", StringComparison.Ordinal);
        var whole = (point < 0 ? body.Length : point) + exponent + shift;
        var lead = digits.Length - digits.TrimStart('0').Length;
        (digits, whole) = (digits[lead..].TrimEnd('0'), whole - lead);
        var plain = whole switch
        {
            <= 0 and > -7 => "0." + new string('0', -whole) + digits,
            > 0 and <= 21 when whole >= digits.Length => digits + new string('0', whole - digits.Length),
            > 0 and <= 21 => digits[..whole] + "." + digits[whole..],
            _ => string.Create(CultureInfo.InvariantCulture, $"{digits[0]}{(digits.Length > 1 ? "." : "")}{digits[1..]}e{whole - 1}"),
        };
        return negative ? "-" + plain : plain;
    }
}
