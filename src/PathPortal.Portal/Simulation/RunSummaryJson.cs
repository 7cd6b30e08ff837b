using System.Text.Json;
using System.Text.Json.Serialization;
using PathPortal.Engine;

namespace PathPortal.Portal.Simulation;

/// <summary>A run's summary as the text it is stored as. Numbers come back bit for bit, infinities included; enumerations are names.</summary>
public static class RunSummaryJson
{
    private static readonly JsonSerializerOptions Options = new()
    {
        NumberHandling = JsonNumberHandling.AllowNamedFloatingPointLiterals,
        DefaultIgnoreCondition = JsonIgnoreCondition.WhenWritingNull,
        Converters = { new JsonStringEnumConverter(namingPolicy: null, allowIntegerValues: false) },
    };

    public static string Write(RunSummary summary) => JsonSerializer.Serialize(summary, Options);

    /// <exception cref="JsonException">The text is no summary.</exception>
    public static RunSummary Read(string json) =>
        JsonSerializer.Deserialize<RunSummary>(json, Options) ?? throw new JsonException("A summary is an object.");
}
