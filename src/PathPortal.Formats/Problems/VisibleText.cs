using System.Globalization;
using System.Text;

namespace PathPortal.Formats.Problems;

/// <summary>Makes text from outside safe to show: nothing in it can hide, reorder or break the line it is shown in.</summary>
public static class VisibleText
{
    /// <summary>Longest shown value, in characters.</summary>
    public const int DefaultLength = 60;

    /// <summary>
    /// The text with control, format, direction, line-separator, private-use, unassigned and lone surrogate characters written as <c>\uXXXX</c>,
    /// cut to <paramref name="maxLength"/> characters of the source with an ellipsis.
    /// </summary>
    public static string Of(string text, int maxLength = DefaultLength)
    {
        ArgumentNullException.ThrowIfNull(text);
        if (text.Length <= maxLength && !text.AsSpan().ContainsAnyExceptInRange(' ', '~'))
        {
            return text;
        }

        var shown = new StringBuilder();
        var taken = 0;
        while (taken < text.Length)
        {
            var known = Rune.TryGetRuneAt(text, taken, out var rune);
            var length = known ? rune.Utf16SequenceLength : 1;
            if (taken + length > maxLength)
            {
                return shown.Append('…').ToString();
            }

            if (known && IsPlain(rune))
            {
                shown.Append(rune.ToString());
            }
            else
            {
                shown.Append(CultureInfo.InvariantCulture, $"\\u{(known ? rune.Value : text[taken]):X4}");
            }

            taken += length;
        }

        return shown.ToString();
    }

    /// <summary>Position of the first character that may not stand in a name or label (control, direction, format, lone surrogate); −1 when none.</summary>
    public static int FirstHidden(string text, bool allowLineFeed = false)
    {
        ArgumentNullException.ThrowIfNull(text);
        for (var i = 0; i < text.Length;)
        {
            if (!Rune.TryGetRuneAt(text, i, out var rune) || (!IsPlain(rune) && !(allowLineFeed && rune.Value == '\n')))
            {
                return i;
            }

            i += rune.Utf16SequenceLength;
        }

        return -1;
    }

    private static bool IsPlain(Rune rune) => Rune.GetUnicodeCategory(rune)
        is not (UnicodeCategory.Control or UnicodeCategory.Format or UnicodeCategory.LineSeparator or UnicodeCategory.ParagraphSeparator
            or UnicodeCategory.PrivateUse or UnicodeCategory.OtherNotAssigned or UnicodeCategory.Surrogate);
}
