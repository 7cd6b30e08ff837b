namespace PathPortal.Engine.Postures;

/// <summary>Halton's points (1960): evenly spread in the unit cube, the same every time.</summary>
internal static class HaltonSequence
{
    private static readonly int[] Bases = [2, 3, 5, 7, 11, 13, 17, 19];

    /// <summary>Coordinate 0..7 of a point from 1: the index written in the coordinate's prime, mirrored at the point; in (0, 1).</summary>
    public static double Value(int index, int coordinate)
    {
        var @base = Bases[coordinate];
        var (value, weight) = (0.0, 1.0);
        for (var rest = index; rest > 0; rest /= @base)
        {
            weight /= @base;
            value += weight * (rest % @base);
        }

        return value;
    }
}
