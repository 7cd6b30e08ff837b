namespace PathPortal.Web.Shared;

/// <summary>An SI value as people at the cell read it: millimetres and degrees, never without unit.</summary>
public static class Quantity
{
    private const double DegreesPerRadian = 180 / Math.PI;

    public static string Text(double? value, string? unit) => value is { } given ? Text(given, unit) : "–";

    public static string Text(double value, string? unit)
    {
        if (double.IsPositiveInfinity(value))
            return "no bound";
        var (factor, shown) = unit switch
        {
            "m" => (1e3, "mm"),
            "m/s" => (1e3, "mm/s"),
            "m/s²" => (1e3, "mm/s²"),
            "rad" => (DegreesPerRadian, "°"),
            "rad/s" => (DegreesPerRadian, "°/s"),
            "rad/s²" => (DegreesPerRadian, "°/s²"),
            "1" or null or "" => (1, ""),
            _ => (1, unit),
        };
        var scaled = value * factor;
        var number = Format.Number(scaled, Decimals(scaled));
        return shown is "" || !double.IsFinite(value) ? number : shown == "°" ? number + shown : $"{number}\u202f{shown}";
    }

    /// <summary>Three figures that count, at most four places: enough to see on which side of a limit a value is.</summary>
    private static int Decimals(double value) => Math.Abs(value) switch
    {
        >= 1000 => 0,
        >= 100 => 1,
        >= 1 => 2,
        >= 0.1 => 3,
        _ => 4,
    };
}
