using System.Text.Json;
using PathPortal.Formats.Problems;

namespace PathPortal.Formats.Json;

/// <summary>A text under a <see cref="TextRule"/>; optional exactly when it may be empty, and then left out when it is.</summary>
internal sealed class TextField<T>(string name, TextRule rule, Func<T, string> get, Action<T, string> set) : Field<T>(name, rule.Least > 0)
{
    public override void Read(JsonPart part, T target, ProblemList problems)
    {
        if (part.Kind == JsonValueKind.String)
        {
            set(target, part.Text);
        }
        else
        {
            Wrong(part, "a text of " + rule.Expected, "This is not a text.", problems);
        }
    }

    public override void Check(T value, string path, ProblemList problems)
    {
        if (rule.Fault(get(value)) is { } fault)
        {
            Wrong(path, get(value) ?? "", rule.Expected, fault, problems);
        }
    }

    public override void Write(Utf8JsonWriter writer, T value)
    {
        if (get(value).Length > 0 || Required)
        {
            writer.WriteString(Name, get(value));
        }
    }
}
