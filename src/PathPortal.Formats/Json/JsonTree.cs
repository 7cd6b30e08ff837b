using System.Globalization;
using System.Text;
using System.Text.Json;
using PathPortal.Formats.Problems;

namespace PathPortal.Formats.Json;

/// <summary>
/// Reads JSON text into parts that know their line and column. Strict RFC 8259: no comments, no trailing commas, no property twice,
/// at most <see cref="MaxDepth"/> levels.
/// </summary>
internal static class JsonTree
{
    public const int MaxDepth = 16;

    /// <summary>The document, or null with the problems added to the list.</summary>
    public static JsonPart? Read(ReadOnlySpan<byte> source, int maxBytes, ProblemList problems)
    {
        if (SourceText.ToUtf8(source, maxBytes, problems) is not { } utf8)
        {
            return null;
        }

        if (utf8.Length == 0)
        {
            problems.Add(1, 1, "", "", "a JSON object", "The file is empty.");
            return null;
        }

        var reader = new Utf8JsonReader(utf8, new JsonReaderOptions { MaxDepth = MaxDepth });
        try
        {
            reader.Read();
            var places = new LinePlaces(utf8);
            var root = ReadPart(ref reader, "", places, problems);
            reader.Read();
            return problems.Any ? null : root;
        }
        catch (Exception error) when (error is JsonException or InvalidOperationException)
        {
            // The reader reports what it was looking at; the last byte it consumed tells where.
            var (line, column) = new LinePlaces(utf8).At(error is JsonException json ? ByteOf(json, utf8) : reader.TokenStartIndex);
            problems.Add(
                line, column, "", "", "well-formed JSON (RFC 8259), at most 16 levels deep, without comments",
                "The text is not well-formed JSON here.");
            return null;
        }
    }

    private static long ByteOf(JsonException error, byte[] utf8)
    {
        var at = 0L;
        for (var line = error.LineNumber ?? 0; line > 0; line--)
        {
            at = Array.IndexOf(utf8, (byte)'\n', (int)at) + 1;
        }

        return Math.Min(at + (error.BytePositionInLine ?? 0), utf8.Length);
    }

    private static JsonPart ReadPart(ref Utf8JsonReader reader, string path, LinePlaces places, ProblemList problems)
    {
        var (line, column) = places.At(reader.TokenStartIndex);
        var part = new JsonPart
        {
            Kind = KindOf(reader.TokenType),
            Path = path,
            Line = line,
            Column = column,
            Text = reader.TokenType switch
            {
                JsonTokenType.String => reader.GetString() ?? "",
                JsonTokenType.StartObject or JsonTokenType.StartArray => "",
                _ => Encoding.UTF8.GetString(reader.ValueSpan),
            },
        };
        if (part.Kind == JsonValueKind.Object)
        {
            ReadProperties(ref reader, part, places, problems);
        }
        else if (part.Kind == JsonValueKind.Array)
        {
            while (reader.Read() && reader.TokenType != JsonTokenType.EndArray)
            {
                var itemPath = string.Create(CultureInfo.InvariantCulture, $"{path}[{part.Items.Count}]");
                part.Items.Add(ReadPart(ref reader, itemPath, places, problems));
            }
        }

        return part;
    }

    private static void ReadProperties(ref Utf8JsonReader reader, JsonPart part, LinePlaces places, ProblemList problems)
    {
        var names = new HashSet<string>(StringComparer.Ordinal);
        while (reader.Read() && reader.TokenType != JsonTokenType.EndObject)
        {
            var name = reader.GetString() ?? "";
            var (line, column) = places.At(reader.TokenStartIndex);
            var path = part.Path.Length == 0 ? name : part.Path + "." + name;
            if (!names.Add(name))
            {
                problems.Add(line, column, path, name, "each property once", "The property is written twice.");
            }

            reader.Read();
            part.Properties.Add(new(name, ReadPart(ref reader, path, places, problems), line, column));
        }
    }

    private static JsonValueKind KindOf(JsonTokenType token) => token switch
    {
        JsonTokenType.StartObject => JsonValueKind.Object,
        JsonTokenType.StartArray => JsonValueKind.Array,
        JsonTokenType.String => JsonValueKind.String,
        JsonTokenType.Number => JsonValueKind.Number,
        JsonTokenType.True => JsonValueKind.True,
        JsonTokenType.False => JsonValueKind.False,
        _ => JsonValueKind.Null,
    };
}
