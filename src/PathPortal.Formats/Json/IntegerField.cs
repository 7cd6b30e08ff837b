using System.Globalization;
using System.Text.Json;
using PathPortal.Formats.Problems;

namespace PathPortal.Formats.Json;

/// <summary>A whole number from a range.</summary>
internal sealed class IntegerField<T>(string name, int low, int high, string unit, Func<T, int> get, Action<T, int> set, Func<int, bool>? also = null)
    : Field<T>(name, required: true)
{
    private string Expected => string.Create(CultureInfo.InvariantCulture, $"a whole number from {low} to {high}{(unit.Length == 0 ? "" : " " + unit)}");

    public override void Read(JsonPart part, T target, ProblemList problems)
    {
        if (part.Kind == JsonValueKind.Number
            && int.TryParse(part.Text, NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture, out var value))
        {
            set(target, value);
        }
        else
        {
            Wrong(part, Expected, "This is not a whole number.", problems);
        }
    }

    public override void Check(T value, string path, ProblemList problems)
    {
        var number = get(value);
        if (number < low || number > high || (also is not null && !also(number)))
        {
            Wrong(path, number.ToString(CultureInfo.InvariantCulture), Expected, "The number is outside its range.", problems);
        }
    }

    public override void Write(Utf8JsonWriter writer, T value) => writer.WriteNumber(Name, get(value));
}
