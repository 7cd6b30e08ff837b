using System.Text.Json;

namespace PathPortal.Formats.Json;

/// <summary>One value of a JSON document with the place it was read from.</summary>
internal sealed class JsonPart
{
    public required JsonValueKind Kind { get; init; }

    /// <summary>Property path such as <c>joints[2].limits.low</c>; empty for the whole document.</summary>
    public required string Path { get; init; }

    public required int Line { get; init; }

    public required int Column { get; init; }

    /// <summary>Decoded text of a string, source text of a number or literal.</summary>
    public string Text { get; init; } = "";

    /// <summary>Properties in source order, names unique.</summary>
    public List<JsonProperty> Properties { get; } = [];

    public List<JsonPart> Items { get; } = [];

    /// <summary>The part in a few characters for messages.</summary>
    public string Shown => Kind switch
    {
        JsonValueKind.Object => "{…}",
        JsonValueKind.Array => "[…]",
        _ => Text,
    };

    /// <summary>The part at a path, or the nearest part around it that exists.</summary>
    public JsonPart Nearest(string path)
    {
        if (path == Path)
        {
            return this;
        }

        foreach (var child in Properties.Select(p => p.Value).Concat(Items))
        {
            if (path.StartsWith(child.Path, StringComparison.Ordinal)
                && (path.Length == child.Path.Length || path[child.Path.Length] is '.' or '['))
            {
                return child.Nearest(path);
            }
        }

        return this;
    }
}
