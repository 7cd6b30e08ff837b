using System.Collections.Immutable;
using PathPortal.Engine.Verdicts;

namespace PathPortal.Engine.Tests.Verdicts;

/// <summary>
/// The rule under test: a stretch begins at the near threshold (0.9 for joint speed in the sheet used), ends below 95 % of it, and takes in what
/// begins again within 0.1 s (25 samples of 4 ms). Joint 1's allowed speed is 2 rad/s, so a demand of 2u has use u.
/// </summary>
public sealed class FindingTests
{
    [Fact]
    public void Findings_OnePeak_HasItsStretchWorstPlaceAndJoint()
    {
        var finding = Assert.Single(Find(Uses((100, 0.91), (101, 1.31), (102, 0.95), (103, 0.86), (104, 0.85))));

        Assert.True(finding.Over);
        Assert.True(finding.Binding);
        Assert.Equal((100, 103, 101), (finding.From.Sample, finding.To.Sample, finding.Worst.Sample));
        Approximately.Equal(1.31, finding.WorstUse, 1e-12, "use");
        Assert.Equal(0, finding.Joint);
        Approximately.Equal(0.404, finding.Worst.Time, 1e-12, "s");
        Assert.Equal(2, finding.Worst.Waypoint);
    }

    [Fact]
    public void Findings_RippleAboutTheThreshold_IsOneFinding()
    {
        var ripple = Enumerable.Range(0, 60).Select(i => (100 + i, i % 2 == 0 ? 0.92 : 0.5)).ToArray();

        var finding = Assert.Single(Find(Uses(ripple)));
        Assert.False(finding.Over);
        Assert.Equal((100, 158), (finding.From.Sample, finding.To.Sample));
    }

    [Theory]
    [InlineData(25, 1)]
    [InlineData(26, 2)]
    public void Findings_TwoPeaks_MergeWithinATenthOfASecond(int distance, int expected) =>
        Assert.Equal(expected, Find(Uses((100, 0.95), (100 + distance, 0.95))).Length);

    [Fact]
    public void Findings_BelowTheNearThreshold_AreNone() => Assert.Empty(Find(Uses((100, 0.899))));

    [Fact]
    public void Findings_InfiniteUse_IsOverAndFirst()
    {
        var samples = Uses((100, 1.5));
        samples.JointSpeedDemands[2][250] = double.NaN;
        var findings = Find(samples);

        Assert.Equal(double.PositiveInfinity, findings[0].WorstUse);
        Assert.Equal(2, findings[0].Joint);
        Assert.Equal(2, findings.Length);
    }

    [Fact]
    public void Findings_MoreThanAreKept_KeepTheWorstAndCountTheRest()
    {
        var samples = TestScenario.Quiet(6000);
        for (var i = 0; i < 100; i++)
        {
            samples.JointSpeedDemands[0][i * 60] = 2 + 0.01 * i;
        }

        var (kept, leftOut) = Judgement.Of(TestScenario.Complete, samples, TestScenario.Fine).Findings();

        Assert.Equal((Judgement.MostFindings, 100 - Judgement.MostFindings), (kept.Length, leftOut));
        Approximately.Equal(1.495, kept[0].WorstUse, 1e-12, "worst");
        Assert.Equal(kept.OrderByDescending(f => f.WorstUse), kept);
    }

    [Fact]
    public void Bins_RandomUses_KeepEveryWorstSample() => Seeded.Cases(50, random =>
    {
        var samples = TestScenario.Quiet(random.Next(1, 3000));
        foreach (var _ in Enumerable.Range(0, 20))
        {
            samples.JointSpeedDemands[0][random.Next(samples.Count)] = random.Between(0, 5);
        }

        var bins = Judgement.Of(TestScenario.Complete, samples, TestScenario.Fine).Bins()!;

        Assert.Equal(Math.Min(512, samples.Count), bins.BinCount);
        Assert.Equal((0, samples.Count), (bins.Edges[0], bins.Edges[^1]));
        for (var row = 0; row < bins.Criteria.Length; row++)
        {
            var use = samples.Use[bins.Criteria[row]];
            for (var b = 0; b < bins.BinCount; b++)
            {
                Assert.True(bins.Edges[b] < bins.Edges[b + 1]);
                var expected = Enumerable.Range(bins.Edges[b], bins.Edges[b + 1] - bins.Edges[b]).Where(k => !double.IsNaN(use[k]))
                    .Select(k => (Sample: k, Use: use[k])).OrderByDescending(s => s.Use).ThenBy(s => s.Sample).FirstOrDefault((Sample: -1, Use: double.NaN));
                Assert.Equal(expected.Sample, bins.WorstSample[row * bins.BinCount + b]);
                Assert.Equal((float)expected.Use, bins.WorstUse[row * bins.BinCount + b]);
            }
        }
    });

    [Theory]
    [InlineData(1 + 5e-10, false)]
    [InlineData(1 + 2e-9, true)]
    public void Bins_UseAtTheLimit_StaysOnItsSideInSinglePrecision(double use, bool fails)
    {
        // 1 + 2e-9 rounds to 1 in single precision, which would read as a pass.
        var bins = Judgement.Of(TestScenario.Complete, Uses((10, use)), TestScenario.Fine).Bins()!;
        var row = bins.Criteria.IndexOf(Criterion.JointSpeed);

        Assert.Equal(fails, bins.WorstUse[row * bins.BinCount + 10] > 1);
    }

    private static RunSamples Uses(params (int Sample, double Use)[] uses)
    {
        var samples = TestScenario.Quiet();
        foreach (var (sample, use) in uses)
        {
            samples.JointSpeedDemands[0][sample] = 2 * use;
        }

        return samples;
    }

    private static ImmutableArray<Finding> Find(RunSamples samples) =>
        Judgement.Of(TestScenario.Complete, samples, TestScenario.Fine).Findings().Kept;
}
