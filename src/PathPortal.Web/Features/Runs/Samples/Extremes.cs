namespace PathPortal.Web.Features.Runs.Samples;

/// <summary>
/// Thins a column for drawing and loses no peak: of every bin of consecutive samples the smallest and the largest value stay, at the samples
/// they belong to. A spike of a single sample is therefore in the picture at every zoom.
/// </summary>
public static class Extremes
{
    /// <summary>
    /// Samples from <paramref name="from"/> up to but not including <paramref name="to"/> that must be drawn, rising. Every sample when there
    /// are no more than two per bin. A bin without any value gives one sample, so that the gap shows.
    /// </summary>
    public static List<int> Pick(Func<int, double> at, int from, int to, int bins)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(bins, 1);
        var count = to - from;
        if (count <= 2L * bins)
            return [.. Enumerable.Range(from, Math.Max(count, 0))];
        var picked = new List<int>(2 * bins);
        for (var bin = 0; bin < bins; bin++)
            PickBin(at, from + Edge(count, bin, bins), from + Edge(count, bin + 1, bins), picked);
        return picked;
    }

    private static int Edge(int count, int bin, int bins) => (int)((long)count * bin / bins);

    private static void PickBin(Func<int, double> at, int from, int to, List<int> picked)
    {
        int least = -1, most = -1;
        double low = 0, high = 0;
        for (var k = from; k < to; k++)
        {
            var value = at(k);
            if (double.IsNaN(value))
                continue;
            if (least < 0 || value < low)
                (least, low) = (k, value);
            if (most < 0 || value > high)
                (most, high) = (k, value);
        }
        if (least < 0)
        {
            picked.Add(from);
            return;
        }
        // Twice the same sample keeps a lone value between two gaps a stroke and not nothing.
        picked.Add(Math.Min(least, most));
        picked.Add(Math.Max(least, most));
    }
}
