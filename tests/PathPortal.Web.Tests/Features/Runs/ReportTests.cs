using System.Globalization;
using AngleSharp.Dom;
using Bunit;
using PathPortal.Engine.Verdicts;
using PathPortal.TestSupport.Runs;
using PathPortal.Web.Features.Runs;
using PathPortal.Web.Features.Runs.Samples;
using PathPortal.Web.Shared;

namespace PathPortal.Web.Tests.Features.Runs;

public sealed class ReportTests : BunitContext
{
    private static readonly InventedRun Invented = InventedRun.Create();
    private static readonly RunView View = ViewOf(Invented);

    [Fact]
    public void UseMap_RowOverItsLimit_HasShapesAboveTheLimitLineAndTheWorstFigure()
    {
        var map = Render<UseMap>(p => p.Add(m => m.Run, View).Add(m => m.Bins, Invented.Bins));
        var row = map.FindAll(".run-row").Single(r => r.TextContent.Contains("joint speed", StringComparison.Ordinal));
        Assert.NotNull(row.QuerySelector("path.use-over"));
        Assert.NotNull(row.QuerySelector("rect.run-over-ground"));
        var outcome = View.Outcome(Criterion.JointSpeed)!;
        Assert.Contains($"{Math.Round(outcome.WorstUse!.Value * 100):0} %", row.TextContent, StringComparison.Ordinal);
        Assert.Equal(outcome.Place!.Value.Sample.ToString(CultureInfo.InvariantCulture), row.QuerySelector("a.run-jump")!.GetAttribute("data-sample"));
    }

    [Fact]
    public void UseMap_SpikeOfOneSample_ShowsAsOver()
    {
        var spiky = InventedRun.Create(spike: 8_321);
        var map = Render<UseMap>(p => p.Add(m => m.Run, ViewOf(spiky)).Add(m => m.Bins, spiky.Bins));
        var row = map.FindAll(".run-row").Single(r => r.TextContent.Contains("across the path", StringComparison.Ordinal));
        Assert.NotNull(row.QuerySelector("path.use-over"));
    }

    [Fact]
    public void UseMap_AdvisoryRow_IsMarkedSo()
    {
        var map = Render<UseMap>(p => p.Add(m => m.Run, View).Add(m => m.Bins, Invented.Bins));
        var row = map.FindAll(".run-row").Single(r => r.TextContent.Contains("singularity", StringComparison.Ordinal));
        Assert.NotNull(row.QuerySelector("svg.advisory"));
    }

    [Fact]
    public void UseMapRow_JustUnderAndJustOverTheLimit_StandOnTheirSidesOfTheLine()
    {
        var bins = new UseBins { Criteria = [Criterion.JointSpeed], Edges = [0, 1, 2, 3], WorstUse = [0.9999f, 1.0001f, float.NaN], WorstSample = [0, 1, -1] };
        var shapes = UseMapRow.Of(bins, 0, 0.8).Shapes.ToDictionary(s => s.Look, s => s.Outline);
        Assert.Equal($"M0 {UseMapRow.Height}V{UseMapRow.LimitLine}H1V{UseMapRow.Height}z", shapes["use-near"]);
        Assert.Equal($"M1 {UseMapRow.Height}V{UseMapRow.LimitLine - 1}H2V{UseMapRow.Height}z", shapes["use-over"]);
        Assert.Equal(2, shapes.Count);
    }

    [Fact]
    public void UseMapRow_WithoutBound_FillsTheRow()
    {
        var bins = new UseBins { Criteria = [Criterion.JointPosition], Edges = [0, 4], WorstUse = [float.PositiveInfinity], WorstSample = [2] };
        Assert.Contains("V0H4", UseMapRow.Of(bins, 0, 0.8).Shapes.Single().Outline, StringComparison.Ordinal);
    }

    [Fact]
    public void Moment_EveryValue_IsAColumnOfTheSamples()
    {
        var columns = SampleColumns.Of(Invented.Samples, Invented.Scenario.Arm, Invented.Scenario.Criteria);
        var moment = Render<RunMoment>(p => p.Add(m => m.Run, View));
        var asked = moment.FindAll("[data-column]").Select(e => e.GetAttribute("data-column")!).ToList();
        var lanes = Lanes.Of(Invented.Scenario.Arm, Invented.Scenario.Criteria).SelectMany(l => l.Lines).Select(l => l.Column);
        Assert.True(asked.Count > 50, $"{asked.Count} values");
        Assert.All(asked.Concat(lanes), name => Assert.True(columns.Find(name) is not null, name));
        Assert.Equal(6, moment.FindAll("tr[data-joint]").Count);
    }

    [Fact]
    public void FindingsTable_EveryFinding_LeadsToItsWorstSample()
    {
        var table = Render<FindingsTable>(p => p.Add(t => t.Run, View));
        var rows = table.FindAll("tbody tr");
        Assert.Equal(View.Summary.Findings.Length, rows.Count);
        for (var i = 0; i < rows.Count; i++)
        {
            var finding = View.Summary.Findings[i];
            var link = rows[i].QuerySelector("a[data-sample]")!;
            Assert.Equal(finding.Worst.Sample.ToString(CultureInfo.InvariantCulture), link.GetAttribute("data-sample"));
            Assert.Equal(string.Create(CultureInfo.InvariantCulture, $"/runs/{View.Id}#t={finding.Worst.Time:0.####}"), link.GetAttribute("href"));
        }
    }

    [Fact]
    public void CriteriaTable_EveryOutcome_HasValueLimitAndWhetherItBinds()
    {
        var table = Render<CriteriaTable>(p => p.Add(t => t.Run, View));
        Assert.Equal(View.Summary.Outcomes.Length, table.FindAll("tbody tr").Count);
        Assert.Contains("not asked", Row("tracking error").TextContent, StringComparison.Ordinal);
        Assert.Contains("advisory", Row("singularity").TextContent, StringComparison.Ordinal);
        // Allowed: 290 °/s times a share of 0.9.
        Assert.Contains("261.0\u202f°/s", Row("joint speed").TextContent, StringComparison.Ordinal);

        IElement Row(string name) => table.FindAll("tbody tr").Single(r => r.QuerySelector("th")!.TextContent.StartsWith(name, StringComparison.Ordinal));
    }

    [Fact]
    public void Verdict_Failing_TellsTheDecisiveFigureOnceAndWhatElseIsClose()
    {
        var verdict = Render<RunVerdict>(p => p.Add(v => v.Run, View));
        var decisive = View.Summary.Outcomes.Where(o => o is { Binding: true, Status: CriterionStatus.Fail }).MaxBy(o => o.WorstUse)!;
        Assert.Contains(Quantity.Text(decisive.Value, decisive.Unit), verdict.Find(".run-figures").TextContent, StringComparison.Ordinal);
        var others = View.Summary.Outcomes.Count(o => o != decisive && o.Status is CriterionStatus.Fail or CriterionStatus.Near);
        Assert.Equal(Math.Min(4, others), verdict.FindAll(".run-close a").Count);
    }

    [Theory]
    [InlineData(0.0021, "m", "2.10\u202fmm")]
    [InlineData(Math.PI, "rad", "180.0°")]
    [InlineData(double.PositiveInfinity, "m", "no bound")]
    [InlineData(double.NaN, "m", "not a number")]
    [InlineData(0.0312, "1", "0.0312")]
    public void Quantity_SiValue_ReadsInUnitsOfTheCell(double value, string unit, string text) => Assert.Equal(text, Quantity.Text(value, unit));

    private static RunView ViewOf(InventedRun run) => new()
    {
        Id = new("0198c0de-0000-7000-8000-000000000001"),
        Sentence = VerdictSentence.Of(run.Summary.Verdict, run.Summary.Outcomes),
        Summary = run.Summary,
        Bins = run.Bins,
        Arm = run.Scenario.Arm,
        Criteria = run.Scenario.Criteria,
        Inputs = new()
        {
            Program = new("Hatch seam"),
            Revision = new("revision 2"),
            Cell = new("North 3"),
            Setup = new("setup 4"),
            Arm = new("Heron 12, version 1"),
            Criteria = new("Sealing, version 3"),
            Plant = "Lakeside",
            Zone = "Europe/Berlin",
            Tool = "nozzle",
            WorkFrame = "fixture",
            Digest = new string('a', 64),
            NumericsVersion = 1,
        },
    };
}
