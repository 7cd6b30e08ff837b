using System.Text.Json;

namespace PathPortal.Formats.Documents;

/// <summary>Words of an enumeration in documents: its names in lower case with underscores.</summary>
internal static class Words
{
    public static string Of<TEnum>(TEnum value)
        where TEnum : struct, Enum => JsonNamingPolicy.SnakeCaseLower.ConvertName(value.ToString());

    public static IReadOnlyList<(string Word, TEnum Choice)> All<TEnum>()
        where TEnum : struct, Enum => [.. Enum.GetValues<TEnum>().Select(v => (Of(v), v))];
}
