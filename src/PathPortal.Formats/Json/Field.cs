using System.Text.Json;
using PathPortal.Formats.Problems;

namespace PathPortal.Formats.Json;

/// <summary>One property of a document: how it is read, checked and written. One declaration serves all three, so they cannot disagree.</summary>
internal abstract class Field<T>(string name, bool required)
{
    public string Name { get; } = name;

    public bool Required { get; } = required;

    /// <summary>The property belongs to the object only while this holds, for example by kind of joint.</summary>
    public Func<T, bool> Applies { get; set; } = static _ => true;

    public abstract void Read(JsonPart part, T target, ProblemList problems);

    public abstract void Check(T value, string path, ProblemList problems);

    public abstract void Write(Utf8JsonWriter writer, T value);

    protected static void Wrong(JsonPart part, string expected, string message, ProblemList problems) =>
        problems.Add(part.Line, part.Column, part.Path, part.Shown, expected, message);

    protected static void Wrong(string path, string value, string expected, string message, ProblemList problems) =>
        problems.Add(0, 0, path, value, expected, message);
}
