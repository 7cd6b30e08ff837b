using System.Globalization;
using System.Text;
using PathPortal.Engine.Verdicts;
using PathPortal.Web.Shared;

namespace PathPortal.Web.Features.Runs;

/// <summary>
/// One criterion along the run as shapes: per step of the use scale one outline that follows the bins. Across it counts samples, upwards
/// use in <see cref="Height"/> for 150 %.
/// </summary>
public sealed class UseMapRow
{
    public const int Height = 30;
    public const double FullUse = 1.5;

    /// <summary>Height of the line at 100 %.</summary>
    public const int LimitLine = Height - (int)(Height / FullUse);

    private UseMapRow(Criterion criterion, IReadOnlyList<Shape> shapes)
    {
        Criterion = criterion;
        Shapes = shapes;
    }

    public Criterion Criterion { get; }

    public IReadOnlyList<Shape> Shapes { get; }

    public static UseMapRow Of(UseBins bins, int row, double near)
    {
        var outlines = new SortedDictionary<LimitUseBand, StringBuilder>();
        var count = bins.BinCount;
        var offset = row * count;
        for (var bin = 0; bin < count;)
        {
            var (band, top) = Look(bins.WorstUse[offset + bin], near);
            if (band == LimitUseBand.NotAssessable)
            {
                bin++;
                continue;
            }
            if (!outlines.TryGetValue(band, out var outline))
                outlines[band] = outline = new();
            // A run of bins in the same step becomes one outline; equal heights become one stroke of it.
            outline.Append(CultureInfo.InvariantCulture, $"M{bins.Edges[bin]} {Height}V{top}");
            var height = top;
            while (++bin < count && Look(bins.WorstUse[offset + bin], near) is var next && next.Band == band)
            {
                if (next.Top == height)
                    continue;
                outline.Append(CultureInfo.InvariantCulture, $"H{bins.Edges[bin]}V{next.Top}");
                height = next.Top;
            }
            outline.Append(CultureInfo.InvariantCulture, $"H{bins.Edges[bin]}V{Height}z");
        }
        return new(bins.Criteria[row], [.. outlines.Select(o => new Shape(LimitUse.Of(SampleOf(o.Key, near), near).CssClass, o.Value.ToString()))]);
    }

    private static (LimitUseBand Band, int Top) Look(float use, double near)
    {
        if (float.IsNaN(use))
            return (LimitUseBand.NotAssessable, Height);
        var share = use < FullUse ? Math.Max(use, 0) / FullUse : 1;
        // Never invisible, and never on the wrong side of the limit line by rounding.
        var top = Math.Min(Height - 2, Height - (int)Math.Round(share * Height, MidpointRounding.AwayFromZero));
        var band = LimitUse.Of(use, near).Band;
        return (band, band == LimitUseBand.Over ? Math.Min(top, LimitLine - 1) : Math.Max(top, LimitLine));
    }

    private static double SampleOf(LimitUseBand band, double near) => band switch
    {
        LimitUseBand.Over => 2,
        LimitUseBand.Near => (near + 1) / 2,
        LimitUseBand.Step3 => near * 0.8,
        LimitUseBand.Step2 => near * 0.6,
        LimitUseBand.Step1 => near * 0.3,
        _ => 0,
    };

    /// <param name="Look">Name of the step's style, as on badges.</param>
    /// <param name="Outline">SVG path data.</param>
    public sealed record Shape(string Look, string Outline);
}
