using PathPortal.Engine.Arms;
using PathPortal.Formats.Documents;
using PathPortal.Formats.Paths;
using PathPortal.Portal.Domain.Programs;
using PathPortal.Portal.Simulation;

namespace PathPortal.Portal.Tests.Simulation;

public sealed class PostureUnitTests
{
    [Theory]
    [InlineData("j1_mm,j2_deg", "250,10", null)]
    [InlineData("j1_deg,j2_deg", "250,10", "The path gives an angle for joint 1, but joint “slide” of the arm “invented” slides.")]
    [InlineData("j1_mm,j2_mm", "250,10", "The path gives a length for joint 2, but joint “turn” of the arm “invented” turns.")]
    public void Build_OfAPathWithPostures_NeedsTheUnitsOfTheArmsJoints(string columns, string cells, string? problem)
    {
        var arm = new ArmDocument
        {
            Name = "invented",
            Joints = [new() { Name = "slide", Kind = JointKind.Prismatic }, new() { Name = "turn", AMm = 300 }],
        };
        var setup = new CellSetupDocument { Tools = [new() { Name = "tool" }], Frames = [new() { Name = "frame" }] };
        var inputs = new ScenarioInputs(arm.ToJson(), setup.ToJson(), new CriteriaDocument().ToJson(), new StartTerms("tool", "frame", null, null));
        var path = PathCsv.Read($"x_mm,y_mm,z_mm,qw,qx,qy,qz,motion,{columns}\n0,0,0,1,0,0,0,joint,,\n10,0,0,,,,,,{cells}\n").Value!.Path;

        var result = ScenarioBuilder.Build(path, inputs);

        string[] expected = problem is null ? [] : [problem];
        Assert.Equal(expected, result.Problems.Select(p => p.Message).Where(m => m.Contains("for joint", StringComparison.Ordinal)));
    }
}
