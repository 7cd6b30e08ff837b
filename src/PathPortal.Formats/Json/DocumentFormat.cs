using System.Buffers;
using System.Collections.Immutable;
using System.Text;
using System.Text.Encodings.Web;
using System.Text.Json;
using System.Text.Unicode;
using PathPortal.Formats.Problems;

namespace PathPortal.Formats.Json;

/// <summary>Reads, checks and writes one kind of document. The first property names the format and its version.</summary>
internal sealed class DocumentFormat<T>(string formatName, Shape<T> shape)
    where T : class, new()
{
    private static readonly JsonWriterOptions WriterOptions = new()
    {
        Indented = true,
        IndentSize = 2,
        NewLine = "\n",
        Encoder = JavaScriptEncoder.Create(UnicodeRanges.All),
    };

    public ReadResult<T> Read(ReadOnlySpan<byte> source)
    {
        var problems = new ProblemList();
        if (JsonTree.Read(source, ReadLimits.DocumentBytes, problems) is not { } root)
        {
            return ReadResult<T>.Refused(problems);
        }

        if (root.Kind != JsonValueKind.Object)
        {
            problems.Add(root.Line, root.Column, "", root.Shown, "a JSON object in braces", "The document is not an object.");
            return ReadResult<T>.Refused(problems);
        }

        var named = root.Properties.FindIndex(p => p.Name == "format");
        var format = named < 0 ? root : root.Properties[named].Value;
        if (named < 0 || format.Kind != JsonValueKind.String || format.Text != formatName)
        {
            problems.Add(
                format.Line, format.Column, "format", named < 0 ? "" : format.Shown, $"“{formatName}”",
                "The document does not name this format.");
            return ReadResult<T>.Refused(problems);
        }

        root.Properties.RemoveAt(named);
        var value = shape.Read(root, problems);
        if (!problems.Any)
        {
            foreach (var problem in Check(value))
            {
                var part = root.Nearest(problem.Field);
                problems.Add(problem with { Line = part.Line, Column = part.Column });
            }
        }

        return ReadResult<T>.Of(value, problems);
    }

    public ImmutableArray<FormatProblem> Check(T value)
    {
        var problems = new ProblemList();
        shape.Check(value, "", problems);
        return problems.Problems;
    }

    /// <summary>Canonical text: fixed order, shortest round-trip numbers, LF, a final LF; equal content gives equal bytes in UTF-8.</summary>
    public string Write(T value)
    {
        var buffer = new ArrayBufferWriter<byte>();
        using (var writer = new Utf8JsonWriter(buffer, WriterOptions))
        {
            writer.WriteStartObject();
            writer.WriteString("format", formatName);
            shape.WriteProperties(writer, value);
            writer.WriteEndObject();
        }

        return Encoding.UTF8.GetString(buffer.WrittenSpan) + "\n";
    }

    /// <summary>Throws when the value does not hold; for conversions, whose callers check first.</summary>
    public void Demand(T value)
    {
        if (Check(value) is [var first, ..])
        {
            throw new InvalidOperationException($"The document does not hold: {first}");
        }
    }
}
