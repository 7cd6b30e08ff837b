using System.Collections.Frozen;
using System.Collections.Immutable;
using PathPortal.Engine.Geometry;

namespace PathPortal.Formats.Documents;

/// <summary>
/// Names of orientation conventions in documents and column names. <c>fixed_xyz</c>: turn about the fixed x, then the fixed y, then the fixed z
/// axis (roll, pitch, yaw). <c>moving_zyx</c>: about z, then about y and x of the frame as turned so far. All twelve axis sequences exist both ways.
/// </summary>
public static class OrientationConvention
{
    public const string Default = "fixed_xyz";

    public const string Quaternion = "quaternion";

    private static readonly FrozenDictionary<string, EulerConvention> ByWord =
        Enum.GetValues<EulerConvention>().ToFrozenDictionary(Documents.Words.Of, StringComparer.Ordinal);

    /// <summary>Every convention by angles, <see cref="Default"/> first.</summary>
    public static ImmutableArray<string> Angles { get; } = [.. Enum.GetValues<EulerConvention>().Select(Documents.Words.Of)];

    /// <summary>Every word a document may use.</summary>
    public static ImmutableArray<string> Words { get; } = [Quaternion, .. Angles];

    /// <summary>The convention in words for people, such as “about fixed axes x, y, z (roll, pitch, yaw)”.</summary>
    public static string Describe(string convention)
    {
        ArgumentNullException.ThrowIfNull(convention);
        if (convention == Quaternion)
        {
            return "quaternion w, x, y, z";
        }

        var letters = string.Join(", ", convention[^3..].ToCharArray());
        return convention.StartsWith("fixed_", StringComparison.Ordinal)
            ? $"about fixed axes {letters}" + (convention == Default ? " (roll, pitch, yaw)" : "")
            : $"about moving axes {letters}";
    }

    internal static EulerConvention ToEuler(string convention) => ByWord[convention];
}
