using System.Collections.Immutable;

namespace PathPortal.Formats.Documents;

/// <summary>
/// Names of orientation conventions in documents and column names. <c>fixed_xyz</c>: turn about the fixed x, then the fixed y, then the fixed z
/// axis (roll, pitch, yaw). <c>moving_zyx</c>: about z, then about y and x of the frame as turned so far. All twelve axis sequences exist both ways.
/// </summary>
public static class OrientationConvention
{
    public const string Default = "fixed_xyz";

    public const string Quaternion = "quaternion";

    private static readonly string[] Sequences = ["xyz", "xzy", "yxz", "yzx", "zxy", "zyx", "xyx", "xzx", "yxy", "yzy", "zxz", "zyz"];

    /// <summary>Every convention by angles, <see cref="Default"/> first.</summary>
    public static ImmutableArray<string> Angles { get; } = [.. Sequences.Select(s => "fixed_" + s), .. Sequences.Select(s => "moving_" + s)];

    /// <summary>Every word a document may use.</summary>
    public static ImmutableArray<string> Words { get; } = [Quaternion, .. Angles];

    /// <summary>The convention in words for people, such as “fixed axes x, y, z (roll, pitch, yaw)”.</summary>
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
}
