using PathPortal.Engine.Arms;

namespace PathPortal.Engine.Postures;

/// <summary>The values of a joint that look the same: an angle plus whole turns, as far as the position limits allow.</summary>
internal static class JointTurns
{
    /// <summary>A full turn (rad).</summary>
    public const double Full = 2 * Math.PI;

    // A joint with more room offers only the values nearest to zero; nobody programs further wound up than this without saying so.
    private const int Most = 5;

    /// <summary>
    /// Every value inside the limits, the one nearest to zero first; empty when there is none. Where a limit is missing, one full turn next to the
    /// limit that is given, or (−π, π], counts as the range.
    /// </summary>
    public static List<double> Inside(Joint joint, double value)
    {
        var (low, high) = (joint.Limits.Low?.Value, joint.Limits.High?.Value);
        if (joint.Kind == JointKind.Prismatic)
        {
            return (low is null || value >= low) && (high is null || value <= high) ? [value] : [];
        }

        var principal = Wrap(value);
        if (joint.Limits.Continuous || (low is null && high is null))
        {
            return [principal];
        }

        // Turns next to the one nearest to zero; a wide range holds far more than anybody wants.
        var from = low ?? high!.Value - Full;
        var to = high ?? low!.Value + Full;
        var nearest = Math.Min(Math.Max(0, Math.Ceiling((from - principal) / Full)), Math.Floor((to - principal) / Full));
        var values = new List<double>();
        for (var step = -Most; step <= Most; step++)
        {
            var candidate = principal + (nearest + step) * Full;
            if (candidate >= from && candidate <= to)
            {
                values.Add(candidate);
            }
        }

        values.Sort((a, b) => Math.Abs(a) != Math.Abs(b) ? Math.Abs(a).CompareTo(Math.Abs(b)) : b.CompareTo(a));
        return values.Count > Most ? values[..Most] : values;
    }

    /// <summary>The value inside the limits nearest to a seed, or null when there is none; continuous joints take any turn.</summary>
    public static double? Nearest(Joint joint, double value, double seed)
    {
        if (joint.Kind == JointKind.Prismatic)
        {
            return Inside(joint, value) is [var only] ? only : null;
        }

        if (joint.Limits.Continuous || (joint.Limits.Low is null && joint.Limits.High is null))
        {
            return seed + Wrap(value - seed);
        }

        var (low, high) = (joint.Limits.Low?.Value ?? double.NegativeInfinity, joint.Limits.High?.Value ?? double.PositiveInfinity);
        var candidate = seed + Wrap(value - seed);
        candidate += candidate < low ? Full * Math.Ceiling((low - candidate) / Full) : 0;
        candidate -= candidate > high ? Full * Math.Ceiling((candidate - high) / Full) : 0;
        return candidate >= low && candidate <= high ? candidate : null;
    }

    /// <summary>The angle in (−π, π].</summary>
    public static double Wrap(double angle)
    {
        var wrapped = angle - Full * Math.Floor(angle / Full + 0.5);
        return wrapped <= -Math.PI ? wrapped + Full : wrapped;
    }
}
