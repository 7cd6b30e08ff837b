using PathPortal.Formats.Documents;
using PathPortal.Formats.Problems;
using PathPortal.Formats.Tables;
using PathPortal.Formats.Urdf;

namespace PathPortal.Web.Features.Arms;

/// <summary>An arm model in a file: a document of this portal, URDF or a DH table, told apart by their first character.</summary>
internal static class ArmFile
{
    public const int MaxBytes = 4 * 1024 * 1024;

    public static async Task<ReadResult<ArmDocument>> ReadAsync(ArmUpload? upload)
    {
        if (upload?.File is not { } file)
            return Refused("", "a file", "No file was sent.");
        if (file.Length > MaxBytes)
            return Refused(Shared.Format.Bytes(file.Length), $"at most {Shared.Format.Bytes(MaxBytes)}", "The file is too large for an arm model.");
        using var memory = new MemoryStream((int)file.Length);
        await file.CopyToAsync(memory);
        var bytes = memory.ToArray();
        return FirstOf(bytes) switch
        {
            '<' => ReadUrdf(bytes, upload),
            '{' => ArmDocument.Read(bytes),
            _ => DhTableCsv.Read(bytes, Path.GetFileNameWithoutExtension(file.FileName)),
        };
    }

    private static ReadResult<ArmDocument> ReadUrdf(byte[] bytes, ArmUpload upload)
    {
        var model = UrdfModel.Read(bytes);
        return model.Ok ? model.Value.ToArm(Given(upload.BaseLink), Given(upload.TipLink)) : model.Refused<ArmDocument>();
    }

    private static string? Given(string? text) => string.IsNullOrWhiteSpace(text) ? null : text.Trim();

    // A byte order mark and white space may stand before it; in UTF-16 there are zero bytes between.
    private static char FirstOf(ReadOnlySpan<byte> bytes)
    {
        foreach (var b in bytes)
        {
            if (b is not (0xEF or 0xBB or 0xBF or 0xFE or 0xFF or 0 or (byte)' ' or (byte)'\t' or (byte)'\r' or (byte)'\n'))
                return (char)b;
        }
        return '\0';
    }

    private static ReadResult<ArmDocument> Refused(string found, string expected, string message) =>
        PathPortal.Formats.Problems.Refused.For<ArmDocument>(new FormatProblem(0, 0, "", found, expected, message));
}
