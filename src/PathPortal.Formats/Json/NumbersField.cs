using System.Globalization;
using System.Text.Json;
using PathPortal.Formats.Problems;

namespace PathPortal.Formats.Json;

/// <summary>A fixed count of numbers of one unit in a list, such as a position.</summary>
internal sealed class NumbersField<T>(string name, int count, NumberRule rule, Func<T, double[]> get, Action<T, double[]> set)
    : Field<T>(name, required: true)
{
    public override void Read(JsonPart part, T target, ProblemList problems)
    {
        if (part.Kind != JsonValueKind.Array || part.Items.Count != count)
        {
            Wrong(
                part, $"a list of {count} numbers{(rule.Unit.Length == 0 ? "" : " in " + rule.Unit)}", "The list does not fit.", problems);
            return;
        }

        var values = new double[count];
        var fine = true;
        for (var i = 0; i < count; i++)
        {
            fine &= NumberField<T>.TryNumber(part.Items[i], rule, problems, out values[i]);
        }

        if (fine)
        {
            set(target, values);
        }
    }

    public override void Check(T value, string path, ProblemList problems)
    {
        var numbers = get(value);
        for (var i = 0; i < numbers.Length; i++)
        {
            if (!rule.Holds(numbers[i]))
            {
                Wrong(
                    string.Create(CultureInfo.InvariantCulture, $"{path}[{i}]"), numbers[i].ToString("R", CultureInfo.InvariantCulture),
                    rule.Expected, "The number is outside its range.", problems);
            }
        }
    }

    public override void Write(Utf8JsonWriter writer, T value)
    {
        writer.WritePropertyName(Name);
        writer.WriteRawValue("[" + string.Join(", ", get(value).Select(NumberField<T>.Text)) + "]");
    }
}
