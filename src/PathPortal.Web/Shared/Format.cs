using System.Globalization;

namespace PathPortal.Web.Shared;

/// <summary>Numbers and times as people read them: decimal point, thin groups, never without a unit.</summary>
public static class Format
{
    private const char ThinSpace = '\u202f';
    private const double DegreesPerRadian = 180 / Math.PI;

    private static readonly NumberFormatInfo Readable = new()
    {
        NumberDecimalSeparator = ".",
        NumberGroupSeparator = ThinSpace.ToString(),
        NegativeSign = "\u2212",
    };

    public const string NotFinite = "not a number";

    public static string Number(double value, int decimals) =>
        double.IsFinite(value) ? Unsigned(value, decimals).ToString("N" + decimals, Readable) : NotFinite;

    public static string Count(long value) => value.ToString("N0", Readable);

    public static string Count(long value, string one, string many) => $"{Count(value)} {(value == 1 ? one : many)}";

    public static string Millimetres(double metres, int decimals = 2) => WithUnit(metres * 1e3, decimals, "mm");

    public static string Degrees(double radians, int decimals = 1) => WithUnit(radians * DegreesPerRadian, decimals, "°", "");

    public static string DegreesPerSecond(double radiansPerSecond, int decimals = 1) => WithUnit(radiansPerSecond * DegreesPerRadian, decimals, "°/s");

    public static string MillimetresPerSecond(double metresPerSecond, int decimals = 0) => WithUnit(metresPerSecond * 1e3, decimals, "mm/s");

    public static string Seconds(double seconds, int decimals = 2) => WithUnit(seconds, decimals, "s");

    public static string Milliseconds(double seconds, int decimals = 0) => WithUnit(seconds * 1e3, decimals, "ms");

    public static string Bytes(long bytes) => bytes switch
    {
        < 1024 => $"{Count(bytes)}{ThinSpace}B",
        < 1024 * 1024 => WithUnit(bytes / 1024.0, 1, "KiB"),
        _ => WithUnit(bytes / 1048576.0, 1, "MiB"),
    };

    /// <summary>A day and a minute in the plant's own zone, the zone named.</summary>
    public static string Moment(DateTimeOffset utc, TimeZoneInfo zone) =>
        TimeZoneInfo.ConvertTime(utc, zone).ToString("yyyy-MM-dd HH:mm", CultureInfo.InvariantCulture) + " " + zone.Id;

    public static string MachineMoment(DateTimeOffset utc) => utc.ToUniversalTime().ToString("yyyy-MM-dd'T'HH:mm:ss.fff'Z'", CultureInfo.InvariantCulture);

    /// <summary>How long ago, for lists where the exact minute stands in the title.</summary>
    public static string Ago(TimeSpan age) => age switch
    {
        { TotalSeconds: < 90 } => "just now",
        { TotalMinutes: < 90 } => $"{Math.Round(age.TotalMinutes):0} min ago",
        { TotalHours: < 36 } => $"{Math.Round(age.TotalHours):0} h ago",
        _ => $"{Math.Round(age.TotalDays):0} days ago",
    };

    private static string WithUnit(double value, int decimals, string unit, string? between = null) =>
        double.IsFinite(value) ? $"{Number(value, decimals)}{between ?? ThinSpace.ToString()}{unit}" : NotFinite;

    // Rounding must not print a minus sign before zero.
    private static double Unsigned(double value, int decimals) => Math.Round(value, Math.Min(decimals, 15), MidpointRounding.AwayFromZero) is 0 ? 0 : value;
}
