using System.Collections.Immutable;

namespace PathPortal.Engine.Verdicts;

/// <summary>Puts use columns into at most 512 bins of equal length, each with its worst sample.</summary>
internal static class UseBinning
{
    public static UseBins Bin(IReadOnlyList<(Criterion Criterion, double[] Use)> columns, int count)
    {
        var bins = Math.Min(UseBins.MaxBins, count);
        var edges = ImmutableArray.CreateBuilder<int>(bins + 1);
        for (var b = 0; b <= bins; b++)
        {
            edges.Add((int)((long)b * count / bins));
        }

        var worstUse = ImmutableArray.CreateBuilder<float>(columns.Count * bins);
        var worstSample = ImmutableArray.CreateBuilder<int>(columns.Count * bins);
        foreach (var (_, use) in columns)
        {
            for (var b = 0; b < bins; b++)
            {
                var worst = -1;
                for (var k = edges[b]; k < edges[b + 1]; k++)
                {
                    worst = UseRules.IsWorse(use[k], worst < 0 ? double.NaN : use[worst]) ? k : worst;
                }

                worstSample.Add(worst);
                worstUse.Add(worst < 0 ? float.NaN : ToFloat(use[worst]));
            }
        }

        return new()
        {
            Criteria = [.. columns.Select(c => c.Criterion)],
            Edges = edges.MoveToImmutable(),
            WorstUse = worstUse.MoveToImmutable(),
            WorstSample = worstSample.MoveToImmutable(),
        };
    }

    // Rounding to float must not make a pass of a failure nor the other way about.
    private static float ToFloat(double use)
    {
        var rounded = (float)use;
        return UseRules.Passes(use) ? Math.Min(rounded, use > 1 ? 1 : rounded)
            : rounded > 1 ? rounded
            : MathF.BitIncrement(1);
    }
}
