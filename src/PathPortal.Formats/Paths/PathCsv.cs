using System.Text;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Paths;
using PathPortal.Formats.Problems;

namespace PathPortal.Formats.Paths;

/// <summary>
/// Path programs as comma-separated text (RFC 4180) with units in the column names; <see cref="PathColumnHelp"/> documents every column. Bad input
/// gives problems with line and column, never an exception. Numbers are machine numbers: decimal point, no thousands marks, whatever the culture.
/// Lengths and shares are scaled as decimals, so the same point in mm and in m gives the same bits.
/// </summary>
public static class PathCsv
{
    /// <summary>Reads a whole file.</summary>
    public static ReadResult<PathFile> Read(ReadOnlySpan<byte> source)
    {
        var problems = new ProblemList();
        return SourceText.ToUtf8(source, ReadLimits.PathBytes, problems) is { } utf8
            ? PathReader.Read(utf8, problems)
            : ReadResult<PathFile>.Refused(problems);
    }

    public static ReadResult<PathFile> Read(string source) => Read(Encoding.UTF8.GetBytes(source));

    /// <summary>Reads a stream to its end, but never more than one byte past the size limit.</summary>
    public static async Task<ReadResult<PathFile>> ReadAsync(Stream source, CancellationToken cancellation = default)
    {
        ArgumentNullException.ThrowIfNull(source);
        using var buffer = new MemoryStream();
        var chunk = new byte[64 * 1024];
        int read;
        while (buffer.Length <= ReadLimits.PathBytes && (read = await source.ReadAsync(chunk, cancellation)) > 0)
        {
            buffer.Write(chunk, 0, read);
        }

        return Read(buffer.GetBuffer().AsSpan(0, (int)buffer.Length));
    }

    /// <summary>
    /// The path as a file that reads back as the same path. Postures are written in radians and metres by the kinds given, else those the path carries, else all
    /// revolute; labels that a spreadsheet would take for formulas get an apostrophe, which reading takes away again.
    /// </summary>
    public static string Write(ToolPath path, IReadOnlyList<JointKind>? jointKinds = null) => PathWriter.Write(path, jointKinds);
}
