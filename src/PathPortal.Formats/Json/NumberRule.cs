using System.Globalization;

namespace PathPortal.Formats.Json;

/// <summary>The range of a number and its unit, in words for messages.</summary>
internal sealed record NumberRule(string Unit, double Low, bool LowAllowed, double High, bool HighAllowed)
{
    public static NumberRule Any(string unit, double most = 1e6) => new(unit, -most, true, most, true);

    public static NumberRule AboveZero(string unit, double most = 1e6) => new(unit, 0, false, most, true);

    public static NumberRule ZeroOrMore(string unit, double most = 1e6) => new(unit, 0, true, most, true);

    public bool Holds(double value) =>
        (LowAllowed ? value >= Low : value > Low) && (HighAllowed ? value <= High : value < High);

    public string Expected => string.Create(
        CultureInfo.InvariantCulture,
        $"a number {(LowAllowed ? "from" : "above")} {Low} {(HighAllowed ? "to" : "and below")} {High}{(Unit.Length == 0 ? "" : " " + Unit)}");
}
