using System.Text.Json;
using PathPortal.Formats.Problems;

namespace PathPortal.Formats.Json;

/// <summary>
/// What an object of a document looks like: its properties in canonical order and rules across them. Reading takes properties in any order,
/// writing always gives the canonical one.
/// </summary>
internal sealed class Shape<T>
    where T : class, new()
{
    private readonly List<Field<T>> _fields = [];
    private readonly List<Action<T, string, ProblemList>> _rules = [];

    public Shape<T> With(Field<T> field, Func<T, bool>? when = null)
    {
        if (when is not null)
        {
            field.Applies = when;
        }

        _fields.Add(field);
        return this;
    }

    /// <summary>A rule across properties; runs when every property holds by itself.</summary>
    public Shape<T> Rule(Action<T, string, ProblemList> rule)
    {
        _rules.Add(rule);
        return this;
    }

    /// <summary>The object with every property that could be read. Fields decide in order, so a kind comes before what depends on it.</summary>
    public T Read(JsonPart part, ProblemList problems)
    {
        var target = new T();
        var taken = new HashSet<string>(StringComparer.Ordinal);
        foreach (var field in _fields.Where(f => f.Applies(target)))
        {
            var found = part.Properties.Find(p => p.Name == field.Name);
            if (found is not null)
            {
                taken.Add(field.Name);
                field.Read(found.Value, target, problems);
            }
            else if (field.Required)
            {
                problems.Add(
                    part.Line, part.Column, PathOf(part.Path, field.Name), "", $"the property “{field.Name}”", "A property is missing.");
            }
        }

        string[] names = [.. _fields.Where(f => f.Applies(target)).Select(f => f.Name)];
        foreach (var (name, value, line, column) in part.Properties.Where(p => !taken.Contains(p.Name)))
        {
            var elsewhere = _fields.Any(f => f.Name == name);
            problems.Add(
                line, column, value.Path, name, NearestName.Hint(name, names),
                elsewhere ? "The property does not belong to an object of this kind." : "The property is not known.");
        }

        return target;
    }

    public void Check(T value, string path, ProblemList problems)
    {
        var before = problems.Count;
        foreach (var field in _fields.Where(f => f.Applies(value)))
        {
            field.Check(value, PathOf(path, field.Name), problems);
        }

        if (problems.Count == before)
        {
            foreach (var rule in _rules)
            {
                rule(value, path, problems);
            }
        }
    }

    public void Write(Utf8JsonWriter writer, T value)
    {
        writer.WriteStartObject();
        WriteProperties(writer, value);
        writer.WriteEndObject();
    }

    public void WriteProperties(Utf8JsonWriter writer, T value)
    {
        foreach (var field in _fields.Where(f => f.Applies(value)))
        {
            field.Write(writer, value);
        }
    }

    public static string PathOf(string path, string name) => path.Length == 0 ? name : path + "." + name;
}
