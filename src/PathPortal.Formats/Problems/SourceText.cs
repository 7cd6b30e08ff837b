using System.Text;
using System.Text.Unicode;

namespace PathPortal.Formats.Problems;

/// <summary>
/// Brings a text file to UTF-8 bytes without a byte order mark: UTF-8, and UTF-16 that announces itself by its mark, are taken; anything else is
/// refused by name. Guessing a code page would turn names into other names.
/// </summary>
internal static class SourceText
{
    private static readonly (byte[] Start, string Name)[] KnownBinary =
    [
        ([0x50, 0x4B, 0x03, 0x04], "a ZIP archive or a spreadsheet workbook"),
        ([0x50, 0x4B, 0x05, 0x06], "an empty ZIP archive"),
        ([0xD0, 0xCF, 0x11, 0xE0], "an old binary office document"),
        ([0x1F, 0x8B], "a gzip archive"),
        ([0x25, 0x50, 0x44, 0x46], "a PDF document"),
        ([0x89, 0x50, 0x4E, 0x47], "a PNG picture"),
        ([0xFF, 0xD8, 0xFF], "a JPEG picture"),
        ([0x7F, 0x45, 0x4C, 0x46], "a program"),
        ([0x37, 0x7A, 0xBC, 0xAF], "a 7z archive"),
        ([0x42, 0x5A, 0x68], "a bzip2 archive"),
        ([0xFD, 0x37, 0x7A, 0x58], "an xz archive"),
        ([0x28, 0xB5, 0x2F, 0xFD], "a zstd archive"),
        ([0x50, 0x41, 0x52, 0x31], "a Parquet file"),
    ];

    /// <summary>The text as UTF-8, or null with one problem added.</summary>
    public static byte[]? ToUtf8(ReadOnlySpan<byte> source, int maxBytes, ProblemList problems)
    {
        if (source.Length > maxBytes)
        {
            problems.Add(0, 0, "", "", $"at most {maxBytes / (1024 * 1024)} MiB", "The file is too large.");
            return null;
        }

        foreach (var (start, name) in KnownBinary)
        {
            if (source.StartsWith(start))
            {
                problems.Add(1, 1, "", "", "a text file in UTF-8", $"This is {name}, not a text file.");
                return null;
            }
        }

        if (source.StartsWith(Encoding.UTF8.Preamble))
        {
            source = source[3..];
        }
        else if (source.StartsWith((ReadOnlySpan<byte>)[0xFF, 0xFE, 0, 0]) || source.StartsWith((ReadOnlySpan<byte>)[0, 0, 0xFE, 0xFF]))
        {
            problems.Add(1, 1, "", "", "UTF-8, or UTF-16 with a byte order mark", "The text is UTF-32.");
            return null;
        }
        else if (source.StartsWith((ReadOnlySpan<byte>)[0xFF, 0xFE]) || source.StartsWith((ReadOnlySpan<byte>)[0xFE, 0xFF]))
        {
            return FromUtf16(source, problems);
        }

        return Checked(source, problems);
    }

    private static byte[]? Checked(ReadOnlySpan<byte> source, ProblemList problems)
    {
        var zero = source.IndexOf((byte)0);
        if (zero >= 0)
        {
            // Text in UTF-16 without its mark has a zero in every second byte; a binary file has them anywhere.
            var looksUtf16 = source.Length > 3 && (source[1] == 0 && source[3] == 0 || source[0] == 0 && source[2] == 0);
            AddAt(source, zero, problems, looksUtf16
                ? "The text looks like UTF-16 without a byte order mark."
                : "A zero byte: this is a binary file, not text.");
            return null;
        }

        if (!Utf8.IsValid(source))
        {
            AddAt(source, ValidLength(source), problems, "A byte that is not UTF-8; the file may be in an older code page.");
            return null;
        }

        return source.ToArray();
    }

    private static byte[]? FromUtf16(ReadOnlySpan<byte> source, ProblemList problems)
    {
        var encoding = new UnicodeEncoding(bigEndian: source[0] == 0xFE, byteOrderMark: false, throwOnInvalidBytes: true);
        try
        {
            var utf8 = Encoding.UTF8.GetBytes(encoding.GetString(source[2..]));
            return Checked(utf8, problems);
        }
        catch (DecoderFallbackException)
        {
            problems.Add(
                0, 0, "", "", "UTF-8, or valid UTF-16 with a byte order mark", "The text announces UTF-16 but is not valid UTF-16.");
            return null;
        }
    }

    private static void AddAt(ReadOnlySpan<byte> source, int offset, ProblemList problems, string message)
    {
        var before = source[..offset];
        var line = 1 + before.Count((byte)'\n');
        var start = before.LastIndexOf((byte)'\n') + 1;
        problems.Add(
            line, 1 + Encoding.UTF8.GetCharCount(before[start..]), "", offset < source.Length ? $"byte {source[offset]:X2}" : "",
            "a text file in UTF-8, or UTF-16 with a byte order mark", message);
    }

    private static int ValidLength(ReadOnlySpan<byte> source)
    {
        var valid = 0;
        while (Rune.DecodeFromUtf8(source[valid..], out _, out var used) == System.Buffers.OperationStatus.Done)
        {
            valid += used;
        }

        return valid;
    }
}
