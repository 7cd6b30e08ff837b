using PathPortal.Engine.Arms;
using PathPortal.Engine.Control;
using PathPortal.Engine.Paths;
using PathPortal.Engine.Tests.Control;

namespace PathPortal.Engine.Tests.Stepping;

public sealed class WholeTurnsTests
{
    // Joint values and uses of two simulations that differ by whole turns differ by rounding the turns' sine and cosine.
    private const double Rounding = 1e-9;

    [Fact]
    public void Run_StartsThatDifferByTurns_AreJudgedAsIfSimulated()
    {
        var limits = new JointLimits
        {
            Low = new(-2 * Math.PI, "invented"),
            High = new(2 * Math.PI, "invented"),
            Speed = new(2, "invented"),
            Acceleration = new(20, "invented"),
        };
        var scenario = LoopScenarios.Square(
            LoopScenarios.BentTool, TaskKind.Pose, LoopScenarios.Controller with { Period = 0.02, ServoTimeConstant = 0.05 }) with
        {
            Arm = TestArms.SixJoints(limits),
            Start = null,
        };
        var all = Simulator.Run(scenario, cancellation: TestContext.Current.CancellationToken).Summary;
        Assert.True(all.Postures.Length > 8, $"{all.Postures.Length} postures");
        foreach (var posture in all.Postures.Take(24))
        {
            var alone = Assert.Single(
                Simulator.Run(scenario with { Start = posture.Joints }, cancellation: TestContext.Current.CancellationToken).Summary.Postures);
            Assert.Equal(alone.Verdict, posture.Verdict);
            Assert.Equal(alone.WorstCriterion, posture.WorstCriterion);
            Assert.True(
                alone.WorstUse == posture.WorstUse || Math.Abs(alone.WorstUse - posture.WorstUse) <= Rounding * Math.Max(1, alone.WorstUse),
                $"{posture.Description}: {alone.WorstUse} alone, {posture.WorstUse} read off");
        }

        Assert.Single(all.Postures, p => p.Chosen);
    }
}
