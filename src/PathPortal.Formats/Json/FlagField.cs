using System.Text.Json;
using PathPortal.Formats.Problems;

namespace PathPortal.Formats.Json;

/// <summary>True or false.</summary>
internal sealed class FlagField<T>(string name, Func<T, bool> get, Action<T, bool> set) : Field<T>(name, required: true)
{
    public override void Read(JsonPart part, T target, ProblemList problems)
    {
        if (part.Kind is JsonValueKind.True or JsonValueKind.False)
        {
            set(target, part.Kind == JsonValueKind.True);
        }
        else
        {
            Wrong(part, "true or false", "This is neither true nor false.", problems);
        }
    }

    public override void Check(T value, string path, ProblemList problems)
    {
    }

    public override void Write(Utf8JsonWriter writer, T value) => writer.WriteBoolean(Name, get(value));
}
