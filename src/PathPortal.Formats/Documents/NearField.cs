using System.Globalization;
using System.Text.Json;
using PathPortal.Engine.Verdicts;
using PathPortal.Formats.Json;
using PathPortal.Formats.Problems;

namespace PathPortal.Formats.Documents;

/// <summary>Near thresholds by criterion: an object whose property names are criteria; left out when none is set.</summary>
internal sealed class NearField(string name) : Field<CriteriaDocument>(name, required: false)
{
    private static readonly NumberRule Rule = NumberRule.AboveZero("%", 100);

    // Yes-or-no criteria have no use of a limit and so no threshold.
    private static readonly IReadOnlyList<(string Word, Criterion Choice)> Criteria =
        [.. Words.All<Criterion>().Where(c => c.Choice < Criterion.Finished)];

    public override void Read(JsonPart part, CriteriaDocument target, ProblemList problems)
    {
        if (part.Kind != JsonValueKind.Object)
        {
            Wrong(part, "an object in braces", "This is not an object.", problems);
            return;
        }

        foreach (var (word, value, line, column) in part.Properties)
        {
            var known = Criteria.FirstOrDefault(c => c.Word == word);
            if (known.Word is null)
            {
                problems.Add(
                    line, column, value.Path, word, NearestName.Hint(word, [.. Criteria.Select(c => c.Word)]),
                    "This is not a criterion with a limit.");
            }
            else if (NumberField<CriteriaDocument>.TryNumber(value, Rule, problems, out var number))
            {
                target.NearPercent[known.Choice] = number;
            }
        }
    }

    public override void Check(CriteriaDocument value, string path, ProblemList problems)
    {
        foreach (var (criterion, percent) in value.NearPercent)
        {
            var word = Words.Of(criterion);
            if (!Criteria.Any(c => c.Choice == criterion))
            {
                Wrong($"{path}.{word}", "", "a criterion with a limit", "This criterion has no threshold.", problems);
            }
            else if (!Rule.Holds(percent))
            {
                Wrong(
                    $"{path}.{word}", percent.ToString("R", CultureInfo.InvariantCulture), Rule.Expected,
                    "The number is outside its range.", problems);
            }
        }
    }

    public override void Write(Utf8JsonWriter writer, CriteriaDocument value)
    {
        if (value.NearPercent.Count == 0)
        {
            return;
        }

        writer.WriteStartObject(Name);
        foreach (var (criterion, percent) in value.NearPercent)
        {
            writer.WritePropertyName(Words.Of(criterion));
            writer.WriteRawValue(NumberField<CriteriaDocument>.Text(percent));
        }

        writer.WriteEndObject();
    }
}
