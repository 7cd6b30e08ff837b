using System.Text.Json;
using PathPortal.Formats.Problems;

namespace PathPortal.Formats.Json;

/// <summary>An object inside an object; null means not given where that is allowed. The shape may depend on the outer object.</summary>
internal sealed class ObjectField<T, TInner>(string name, bool required, Func<T, Shape<TInner>> shape, Func<T, TInner?> get, Action<T, TInner> set)
    : Field<T>(name, required)
    where TInner : class, new()
{
    public override void Read(JsonPart part, T target, ProblemList problems)
    {
        if (part.Kind == JsonValueKind.Object)
        {
            set(target, shape(target).Read(part, problems));
        }
        else
        {
            Wrong(part, "an object in braces", "This is not an object.", problems);
        }
    }

    public override void Check(T value, string path, ProblemList problems)
    {
        if (get(value) is { } inner)
        {
            shape(value).Check(inner, path, problems);
        }
        else if (Required)
        {
            Wrong(path, "", "a value", "The value is missing.", problems);
        }
    }

    public override void Write(Utf8JsonWriter writer, T value)
    {
        if (get(value) is { } inner)
        {
            writer.WritePropertyName(Name);
            shape(value).Write(writer, inner);
        }
    }
}
