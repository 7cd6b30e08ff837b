using PathPortal.Engine.Measures;

namespace PathPortal.Engine.Verdicts;

/// <summary>
/// Finds the stretches where a criterion is near or over its limit. A stretch begins where use reaches the near threshold, ends where it falls below 95 %
/// of the threshold or the criterion no longer applies, and takes in a following stretch that begins within 0.1 s, so that ripple
/// about the threshold makes one finding and not a hundred.
/// </summary>
internal static class FindingFinder
{
    private const double Hysteresis = 0.95;
    private const double MergeGap = 0.1; // s

    /// <summary>The stretches of one criterion in order of time.</summary>
    public static List<Finding> Find(LimitMeasure measure, double[] use, double near, bool binding, RunSamples samples)
    {
        var gap = Math.Max(1, (int)(MergeGap / samples.Period));
        var findings = new List<Finding>();
        var (from, to, worst) = (-1, -1, -1);

        void Close()
        {
            findings.Add(new(
                measure.Criterion,
                !UseRules.Passes(use[worst]),
                binding,
                ExtremeValues.PlaceOf(samples, from),
                ExtremeValues.PlaceOf(samples, to),
                ExtremeValues.PlaceOf(samples, worst),
                use[worst],
                measure.Explain(worst).Joint));
        }

        var inside = false;
        for (var k = 0; k < use.Length; k++)
        {
            // Over the limit is always part of a finding, however high the threshold was put.
            var starts = use[k] >= near || use[k] > 1 + UseRules.Slack;
            inside = starts || (inside && use[k] >= Hysteresis * near);
            if (!inside)
            {
                continue;
            }

            if (from >= 0 && k - to > gap)
            {
                Close();
                from = -1;
            }

            (from, worst) = from < 0 ? (k, k) : (from, use[k] > use[worst] ? k : worst);
            to = k;
        }

        if (from >= 0)
        {
            Close();
        }

        return findings;
    }

    /// <summary>Worst first: over before near, binding before advice, then by use, then by time.</summary>
    public static IEnumerable<Finding> WorstFirst(IEnumerable<Finding> findings) => findings
        .OrderByDescending(f => f.Over && f.Binding)
        .ThenByDescending(f => f.Over)
        .ThenByDescending(f => f.WorstUse)
        .ThenBy(f => f.Worst.Sample)
        .ThenBy(f => f.Criterion);
}
