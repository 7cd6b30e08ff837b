using System.Text.Json;
using PathPortal.Formats.Problems;

namespace PathPortal.Formats.Json;

/// <summary>One of a fixed set of words.</summary>
internal sealed class ChoiceField<T, TChoice>(string name, IReadOnlyList<(string Word, TChoice Choice)> words, Func<T, TChoice> get, Action<T, TChoice> set)
    : Field<T>(name, required: true)
    where TChoice : notnull
{
    private IReadOnlyCollection<string> Words => [.. words.Select(w => w.Word)];

    public override void Read(JsonPart part, T target, ProblemList problems)
    {
        foreach (var (word, choice) in words)
        {
            if (part.Kind == JsonValueKind.String && part.Text == word)
            {
                set(target, choice);
                return;
            }
        }

        Wrong(part, NearestName.Hint(part.Text, Words), "This is not a known word.", problems);
    }

    public override void Check(T value, string path, ProblemList problems)
    {
        if (!words.Any(w => w.Choice.Equals(get(value))))
        {
            Wrong(path, get(value).ToString() ?? "", "one of " + string.Join(", ", Words), "This is not a known choice.", problems);
        }
    }

    public override void Write(Utf8JsonWriter writer, T value) =>
        writer.WriteString(Name, words.First(w => w.Choice.Equals(get(value))).Word);
}
