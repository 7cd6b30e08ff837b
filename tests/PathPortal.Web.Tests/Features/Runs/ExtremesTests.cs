using PathPortal.Web.Features.Runs.Samples;

namespace PathPortal.Web.Tests.Features.Runs;

public sealed class ExtremesTests
{
    private const int Count = 15_001;

    [Fact]
    public void Pick_FewSamples_KeepsEveryOne() =>
        Assert.Equal(Enumerable.Range(10, 40), Extremes.Pick(k => k, 10, 50, 20));

    [Fact]
    public void Pick_SpikeOfOneSample_IsKeptAtItsSampleAtEveryZoom()
    {
        foreach (var spike in new[] { 0, 1, 7_321, Count - 1 })
            foreach (var sign in new[] { 1, -1 })
                for (var window = Count; window >= 8; window /= 2)
                    foreach (var bins in new[] { 1, 3, 636, 4000 })
                    {
                        var from = Math.Clamp(spike - window / 3, 0, Count - window);
                        var picked = Extremes.Pick(k => k == spike ? sign * 50 : Math.Sin(k * 0.01), from, from + window, bins);
                        Assert.True(picked.Contains(spike), $"spike {sign} at {spike}, window {window} from {from}, {bins} bins");
                    }
    }

    [Fact]
    public void Pick_RandomColumns_EveryBinKeepsItsLeastAndItsMost()
    {
        for (var seed = 1; seed <= 300; seed++)
        {
            var random = new Random(seed);
            var count = random.Next(2, 5000);
            var bins = random.Next(1, 900);
            // A third absent, some without bound: what samples look like outside process sections and past hard limits.
            var values = Enumerable.Range(0, count).Select(_ => random.Next(9) switch
            {
                < 3 => double.NaN,
                3 => double.PositiveInfinity,
                _ => random.NextDouble() * 2 - 1,
            }).ToArray();
            var picked = Extremes.Pick(k => values[k], 0, count, bins);

            Assert.True(picked.SequenceEqual(picked.Order()), $"seed {seed}: not in order");
            Assert.True(picked.Count <= Math.Max(2 * bins, 0), $"seed {seed}: {picked.Count} samples for {bins} bins");
            for (var bin = 0; bin < bins; bin++)
            {
                var (from, to) = ((int)((long)count * bin / bins), (int)((long)count * (bin + 1) / bins));
                var there = Enumerable.Range(from, to - from).Select(k => values[k]).Where(v => !double.IsNaN(v)).ToList();
                var kept = picked.Where(k => k >= from && k < to).Select(k => values[k]).Where(v => !double.IsNaN(v)).ToList();
                if (there.Count == 0)
                    continue;
                Assert.True(kept.Count > 0 && kept.Max().Equals(there.Max()) && kept.Min().Equals(there.Min()), $"seed {seed}, bin {bin} of {bins}, {count} samples");
            }
        }
    }

    [Fact]
    public void Pick_BinWithoutValues_KeepsOneSampleForTheGap()
    {
        var picked = Extremes.Pick(k => k is >= 100 and < 200 ? double.NaN : 1, 0, 300, 30);
        Assert.Contains(picked, k => k is >= 100 and < 200);
    }
}
