namespace PathPortal.Formats.Json;

/// <summary>One property of a JSON object; line and column are those of its name.</summary>
internal sealed record JsonProperty(string Name, JsonPart Value, int Line, int Column);
