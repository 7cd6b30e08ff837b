using System.Globalization;

namespace PathPortal.Engine;

/// <summary>Numbers in messages: invariant, shortest form.</summary>
internal static class InputText
{
    public static string Of(double value) => value.ToString("G6", CultureInfo.InvariantCulture);
}
