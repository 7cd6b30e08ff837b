using PathPortal.Engine.Verdicts;

namespace PathPortal.Web.Features.Runs.Samples;

/// <summary>What the run page's scripts may ask of a run's samples, as bytes.</summary>
public static class SampleAnswers
{
    public const int MaxBins = 4000;
    public const int MaxBlock = 1024;
    private const int MaxNames = 100;

    /// <summary>Named columns over a window, thinned to at most two samples per bin.</summary>
    public static byte[] Window(RunMaterial run, int? from, int? to, int bins, string names)
    {
        var columns = Columns(run);
        var first = Math.Clamp(from ?? 0, 0, run.Samples.Count - 1);
        var end = Math.Clamp(to ?? run.Samples.Count, first + 1, run.Samples.Count);
        var packed = new PackedSamples();
        foreach (var name in names.Split(',', MaxNames + 1).Take(MaxNames).Distinct(StringComparer.Ordinal))
            if (columns.Find(name) is { } column)
                packed.AddPoints(column, Extremes.Pick(column.At, first, end, Math.Clamp(bins, 1, MaxBins)));
        return packed.ToBytes(new { from = first, to = end });
    }

    /// <summary>Every column at every sample of a short stretch.</summary>
    public static byte[] Block(RunMaterial run, int from, int count)
    {
        var first = Math.Clamp(from, 0, run.Samples.Count - 1);
        var end = Math.Min(run.Samples.Count, first + Math.Clamp(count, 1, MaxBlock));
        var packed = new PackedSamples();
        foreach (var column in Columns(run).All)
            packed.AddValues(column, first, end);
        return packed.ToBytes(new { from = first, to = end });
    }

    /// <summary>The stored bins: worst use and its sample by criterion.</summary>
    public static byte[] Bins(UseBins bins)
    {
        var packed = new PackedSamples();
        packed.AddSamples("edges", bins.Edges);
        for (var row = 0; row < bins.Criteria.Length; row++)
        {
            packed.AddSamples($"worst.{bins.Criteria[row]}", [.. bins.WorstSample.AsSpan().Slice(row * bins.BinCount, bins.BinCount)]);
            packed.AddValues(SampleColumns.UseName(bins.Criteria[row]), bins.WorstUse.AsSpan().Slice(row * bins.BinCount, bins.BinCount));
        }
        return packed.ToBytes(new { });
    }

    private static SampleColumns Columns(RunMaterial run) => SampleColumns.Of(run.Samples, run.Scenario.Arm, run.Scenario.Criteria);
}
