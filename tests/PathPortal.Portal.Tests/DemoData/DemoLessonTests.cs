using PathPortal.Engine;
using PathPortal.Engine.Verdicts;
using PathPortal.Formats.Documents;
using PathPortal.Portal.Demo;
using PathPortal.Portal.Simulation;

namespace PathPortal.Portal.Tests.DemoData;

/// <summary>Each invented program is there to show one thing; these hold it to that. The numbers are the demo's own, not outside values.</summary>
public sealed class DemoLessonTests
{
    private static readonly Dictionary<string, ArmDocument> Arms =
        new ArmDocument[] { DemoArms.Bench(), DemoArms.Floor(), DemoArms.Track() }.ToDictionary(a => a.Name);

    [Theory]
    [InlineData("Seal 1")]
    [InlineData("Seal 2")]
    [InlineData("Seal 3")]
    [InlineData("Seal 4")]
    [InlineData("Seal 5")]
    public void DoorFrame_FirstRevision_IsCleanOnEveryCell(string cell) =>
        Assert.Equal(Verdict.Pass, Simulate("Door frame seal bead", 1, cell).Verdict);

    [Fact]
    public void DoorFrame_SecondRevision_RunsOutOfJointSpeedOnSeal4Only()
    {
        var failing = Simulate("Door frame seal bead", 2, "Seal 4");
        Assert.Equal(Verdict.Fail, failing.Verdict);
        Assert.Equal([Criterion.JointSpeed], Failed(failing));

        Assert.All((string[])["Seal 1", "Seal 2", "Seal 3", "Seal 5"], cell =>
            Assert.Equal(Verdict.Pass, Simulate("Door frame seal bead", 2, cell).Verdict));
    }

    [Fact]
    public void GasketGroove_SecondRevision_LeavesTheToleranceWhereTheServoLags()
    {
        var lagging = Simulate("Gasket groove trace", 2, "Seal 2");
        Assert.Equal([Criterion.AcrossPath], Failed(lagging));
        Assert.Equal(Verdict.Pass, Simulate("Gasket groove trace", 2, "Seal 1").Verdict);
        Assert.Equal(Verdict.Pass, Simulate("Gasket groove trace", 1, "Seal 2").Verdict);
    }

    [Fact]
    public void HousingEdge_SecondRevision_PassesNearAJointLimit()
    {
        var summary = Simulate("Housing edge deburring", 2, "Trim 1");
        Assert.Equal(Verdict.Pass, summary.Verdict);
        Assert.Equal(CriterionStatus.Near, summary.Outcomes.Single(o => o.Criterion == Criterion.JointPosition).Status);
    }

    [Fact]
    public void BracketSeam_FirstRevision_FailsAtTheWristSingularityAndTheSecondPasses()
    {
        var first = Simulate("Bracket weld seam", 1, "Weld 1");
        Assert.Equal(Verdict.Fail, first.Verdict);
        Assert.True(first.Outcomes.Single(o => o.Criterion == Criterion.Singularity).WorstUse > 1);
        Assert.Equal(Verdict.Pass, Simulate("Bracket weld seam", 2, "Weld 1").Verdict);
    }

    [Fact]
    public void PanelDrilling_FirstRevision_PassesOnDrill1() =>
        Assert.Equal(Verdict.Pass, Simulate("Panel drilling", 1, "Drill 1").Verdict);

    [Fact]
    public void PanelPolishing_FirstRevision_PassesOnTheTrack() =>
        Assert.Equal(Verdict.Pass, Simulate("Panel polishing", 1, "Finish 1").Verdict);

    private static IEnumerable<Criterion> Failed(RunSummary summary) =>
        summary.Outcomes.Where(o => o is { Binding: true, Status: CriterionStatus.Fail }).Select(o => o.Criterion);

    private static RunSummary Simulate(string programName, int revision, string cellName)
    {
        var program = DemoPrograms.All.Single(p => p.Name == programName);
        var cell = DemoFleet.Cells.Single(c => c.Name == cellName);
        var terms = program.Runs.Single(r => r.Cell == cellName).Terms;
        var criteria = DemoCriteria.All.Single(c => c.Name == program.Criteria).Sheet;
        var built = ScenarioBuilder.Build(
            "csv", DemoPrograms.Read(program.Revisions[revision - 1].File), new(Arms[cell.Arm].ToJson(), cell.Setup.ToJson(), criteria.ToJson(), terms));
        Assert.True(built.Ok, built.ProblemText);
        return Simulator.Run(built.Scenario, keepSamples: false, progress: null, TestContext.Current.CancellationToken).Summary;
    }
}
