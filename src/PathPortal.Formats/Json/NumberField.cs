using System.Globalization;
using System.Text.Json;
using PathPortal.Formats.Problems;

namespace PathPortal.Formats.Json;

/// <summary>A number with a unit; null means not given where that is allowed.</summary>
internal sealed class NumberField<T>(string name, bool required, NumberRule rule, Func<T, double?> get, Action<T, double?> set)
    : Field<T>(name, required)
{
    public override void Read(JsonPart part, T target, ProblemList problems)
    {
        if (TryNumber(part, rule, problems, out var value))
        {
            set(target, value);
        }
    }

    public override void Check(T value, string path, ProblemList problems)
    {
        if (get(value) is not { } number)
        {
            if (Required)
            {
                Wrong(path, "", rule.Expected, "The number is missing.", problems);
            }
        }
        else if (!rule.Holds(number))
        {
            Wrong(path, number.ToString("R", CultureInfo.InvariantCulture), rule.Expected, "The number is outside its range.", problems);
        }
    }

    public override void Write(Utf8JsonWriter writer, T value)
    {
        if (get(value) is { } number)
        {
            writer.WritePropertyName(Name);
            writer.WriteRawValue(Text(number));
        }
    }

    /// <summary>Shortest text that reads back as the same number; minus zero is written as zero.</summary>
    public static string Text(double number) => (number + 0.0).ToString("R", CultureInfo.InvariantCulture);

    public static bool TryNumber(JsonPart part, NumberRule rule, ProblemList problems, out double value)
    {
        value = 0;
        if (part.Kind != JsonValueKind.Number)
        {
            Wrong(part, rule.Expected, "This is not a number.", problems);
            return false;
        }

        value = double.Parse(part.Text, NumberStyles.Float, CultureInfo.InvariantCulture);
        if (!double.IsFinite(value))
        {
            Wrong(part, rule.Expected, "The number is too large.", problems);
            return false;
        }

        return true;
    }
}
