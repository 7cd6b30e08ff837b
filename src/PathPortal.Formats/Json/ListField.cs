using System.Globalization;
using System.Text.Json;
using PathPortal.Formats.Problems;

namespace PathPortal.Formats.Json;

/// <summary>A list of objects of one shape, with unique names where asked for.</summary>
internal sealed class ListField<T, TItem>(
    string name, int least, int most, string what, Func<T, Shape<TItem>> shape, Func<T, List<TItem>> list, Func<TItem, string> nameOf)
    : Field<T>(name, required: true)
    where TItem : class, new()
{
    private string Expected => string.Create(CultureInfo.InvariantCulture, $"{least} to {most} {what}");

    public override void Read(JsonPart part, T target, ProblemList problems)
    {
        if (part.Kind != JsonValueKind.Array)
        {
            Wrong(part, Expected + " in a list", "This is not a list.", problems);
            return;
        }

        foreach (var item in part.Items)
        {
            if (item.Kind == JsonValueKind.Object)
            {
                list(target).Add(shape(target).Read(item, problems));
            }
            else
            {
                Wrong(item, "an object in braces", "This is not an object.", problems);
            }
        }
    }

    public override void Check(T value, string path, ProblemList problems)
    {
        var items = list(value);
        if (items.Count < least || items.Count > most)
        {
            Wrong(path, items.Count.ToString(CultureInfo.InvariantCulture), Expected, "The list has the wrong length.", problems);
        }

        var names = new HashSet<string>(StringComparer.OrdinalIgnoreCase);
        for (var i = 0; i < items.Count; i++)
        {
            var itemPath = string.Create(CultureInfo.InvariantCulture, $"{path}[{i}]");
            shape(value).Check(items[i], itemPath, problems);
            if (!names.Add(nameOf(items[i])))
            {
                Wrong(
                    itemPath + ".name", nameOf(items[i]), "a name of its own (capital letters don't count)", "The name is used twice.",
                    problems);
            }
        }
    }

    public override void Write(Utf8JsonWriter writer, T value)
    {
        writer.WriteStartArray(Name);
        foreach (var item in list(value))
        {
            shape(value).Write(writer, item);
        }

        writer.WriteEndArray();
    }
}
