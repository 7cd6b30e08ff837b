using System.Globalization;
using System.Text.Encodings.Web;
using System.Text.Json;

namespace PathPortal.Portal.Domain.History;

/// <summary>The canonical bytes of an entry.</summary>
public static class HistoryContent
{
    private static readonly JsonWriterOptions Options = new() { Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping };

    /// <summary>Fixed order of members, no white space, UTC with microseconds.</summary>
    public static byte[] Write(HistoryEntry entry, IReadOnlyList<KeyValuePair<string, string>> details)
    {
        using var bytes = new MemoryStream();
        using (var json = new Utf8JsonWriter(bytes, Options))
        {
            json.WriteStartObject();
            json.WriteNumber("sequence", entry.Sequence);
            json.WriteString("at", Instant(entry.At));
            json.WriteString("actor", entry.ActorId?.ToString());
            json.WriteString("actorName", entry.ActorName);
            json.WriteString("plant", entry.PlantId?.ToString());
            json.WriteString("subjectKind", entry.SubjectKind);
            json.WriteString("subject", entry.SubjectId.ToString());
            json.WriteString("action", entry.Action);
            json.WriteStartObject("details");
            foreach (var (name, value) in details)
                json.WriteString(name, value);
            json.WriteEndObject();
            json.WriteEndObject();
        }
        return bytes.ToArray();
    }

    /// <summary>The details, in the order they were written.</summary>
    public static IReadOnlyList<KeyValuePair<string, string>> ReadDetails(byte[] content)
    {
        using var json = JsonDocument.Parse(content);
        return [.. json.RootElement.GetProperty("details").EnumerateObject().Select(p => KeyValuePair.Create(p.Name, p.Value.GetString() ?? ""))];
    }

    /// <summary>The first column that says something else than the content; null when all agree.</summary>
    public static string? FirstDifference(HistoryEntry entry)
    {
        try
        {
            using var json = JsonDocument.Parse(entry.Content);
            var root = json.RootElement;
            (string Column, string? Stored, string? Content)[] pairs =
            [
                ("sequence", entry.Sequence.ToString(CultureInfo.InvariantCulture), root.GetProperty("sequence").GetRawText()),
                ("at", Instant(entry.At), root.GetProperty("at").GetString()),
                ("actor", entry.ActorId?.ToString(), root.GetProperty("actor").GetString()),
                ("actor name", entry.ActorName, root.GetProperty("actorName").GetString()),
                ("plant", entry.PlantId?.ToString(), root.GetProperty("plant").GetString()),
                ("subject kind", entry.SubjectKind, root.GetProperty("subjectKind").GetString()),
                ("subject", entry.SubjectId.ToString(), root.GetProperty("subject").GetString()),
                ("action", entry.Action, root.GetProperty("action").GetString()),
            ];
            return pairs.FirstOrDefault(p => p.Stored != p.Content).Column;
        }
        catch (Exception e) when (e is JsonException or KeyNotFoundException or InvalidOperationException)
        {
            return "content";
        }
    }

    private static string Instant(DateTimeOffset at) =>
        at.UtcDateTime.ToString("yyyy-MM-dd'T'HH:mm:ss.ffffff'Z'", CultureInfo.InvariantCulture);
}
