using System.Text;
using PathPortal.Portal.Simulation;
using PathPortal.Portal.Tests.Jobs;

namespace PathPortal.Portal.Tests.Simulation;

/// <summary>Web and worker come to the same digest; what does not fit together is told in words.</summary>
public sealed class ScenarioBuilderTests
{
    private static readonly byte[] Path = Encoding.UTF8.GetBytes(JobScene.Path(1));

    [Fact]
    public void Build_SameInputs_GivesSameDigest()
    {
        var first = ScenarioBuilder.Build("csv", Path, JobScene.Inputs());
        var second = ScenarioBuilder.Build("csv", Path, JobScene.Inputs());

        Assert.True(first.Ok, first.ProblemText);
        Assert.Equal(first.Digest, second.Digest);
    }

    [Fact]
    public void Build_AnotherStart_GivesAnotherDigest() => Assert.NotEqual(
        ScenarioBuilder.Build("csv", Path, JobScene.Inputs()).Digest,
        ScenarioBuilder.Build("csv", Path, JobScene.Inputs(t => t with { StartJoints = null })).Digest);

    [Fact]
    public void Build_ToolNotInTheSetup_NamesItAndThoseThere()
    {
        var built = ScenarioBuilder.Build("csv", Path, JobScene.Inputs(t => t with { ToolName = "brush" }));

        var problem = Assert.Single(built.Problems);
        Assert.Equal(ScenarioPart.Setup, problem.Part);
        Assert.Contains("“brush”", problem.Message, StringComparison.Ordinal);
        Assert.Contains("“nozzle”", problem.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Build_FrameNotInTheSetup_NamesIt() => Assert.Contains(
        "“table”", ScenarioBuilder.Build("csv", Path, JobScene.Inputs(t => t with { WorkFrameName = "table" })).ProblemText, StringComparison.Ordinal);

    [Fact]
    public void Build_StartOfAnotherArm_SaysHowManyValuesAreNeeded()
    {
        var built = ScenarioBuilder.Build("csv", Path, JobScene.Inputs(t => t with { StartJoints = [0, 0, 0, 0, 0, 0, 0] }));

        Assert.Equal("The start posture has 7 values, but the arm “Invented arm” has 6 joints.", built.ProblemText);
        Assert.Equal(ScenarioPart.Terms, Assert.Single(built.Problems).Part);
    }

    [Theory]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    public void Build_StartThatIsNoNumber_IsAProblem(double value) => Assert.Contains(
        "“J2”", ScenarioBuilder.Build("csv", Path, JobScene.Inputs(t => t with { StartJoints = [0, value, 0, 0, 0, 0] })).ProblemText, StringComparison.Ordinal);

    [Fact]
    public void Build_BytesThatAreNoPath_AreAProblemOfThePath() => Assert.All(
        ScenarioBuilder.Build("csv", [1, 2, 3], JobScene.Inputs()).Problems, p => Assert.Equal(ScenarioPart.Path, p.Part));

    [Fact]
    public void Build_UnknownFormat_SaysWhich() => Assert.Contains(
        "“tape”", ScenarioBuilder.Build("tape", Path, JobScene.Inputs()).ProblemText, StringComparison.Ordinal);
}
