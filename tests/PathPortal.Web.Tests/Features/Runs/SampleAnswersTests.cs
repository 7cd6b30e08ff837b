using PathPortal.Engine.Verdicts;
using PathPortal.TestSupport.Runs;
using PathPortal.Web.Features.Runs.Samples;

namespace PathPortal.Web.Tests.Features.Runs;

public sealed class SampleAnswersTests
{
    private const int Spike = 8_321;

    // float32 keeps 24 bits.
    private const double RelativeFloat32 = 6e-8;

    private static readonly InventedRun Run = InventedRun.Create(spike: Spike);
    private static readonly RunMaterial Material = new(Run.Scenario, Run.Samples);

    [Fact]
    public void Window_WholeRun_HasTheSpikeInMillimetresAtItsSample()
    {
        var (samples, values) = new Packed(SampleAnswers.Window(Material, null, null, 600, "across,track")).Thinned("across");
        var at = Array.IndexOf(samples, Spike);
        Assert.True(at >= 0);
        AssertClose(Run.Samples.AcrossPath[Spike] * 1e3, values[at]);
        Assert.True(samples.Length <= 1200);
    }

    [Fact]
    public void Window_ZoomedIn_GivesEverySampleOfTheWindow()
    {
        var packed = new Packed(SampleAnswers.Window(Material, Spike - 50, Spike + 50, 600, "across"));
        var (samples, _) = packed.Thinned("across");
        Assert.Equal(Enumerable.Range(Spike - 50, 100), samples);
        Assert.Equal(Spike - 50, packed.About.GetProperty("from").GetInt32());
    }

    [Fact]
    public void Window_UnknownColumnsAndLimitsBeyondTheRun_AnswersWithWhatThereIs()
    {
        var packed = new Packed(SampleAnswers.Window(Material, -5, int.MaxValue, int.MaxValue, "nonsense,sigma"));
        Assert.Equal(["sigma"], packed.Names);
        Assert.Equal(Run.Count, packed.About.GetProperty("to").GetInt32());
    }

    [Fact]
    public void Block_AnyStretch_HoldsEveryColumnInUnitsOfThePage()
    {
        var packed = new Packed(SampleAnswers.Block(Material, 9_000, 256));
        AssertClose(Run.Samples.Joints[4][9_003] * 180 / Math.PI, packed.Values("q4")[3]);
        AssertClose(Run.Samples.Use[Criterion.JointSpeed][9_003] * 100, packed.Values("use.JointSpeed")[3]);
        AssertClose(Run.Samples.SigmaMax[9_003] / Run.Samples.SigmaMin[9_003], packed.Values("condition")[3]);
        var limit = Run.Scenario.Arm.Joints[2].Limits;
        AssertClose(
            Math.Min(Run.Samples.Joints[2][9_003] - limit.Low!.Value.Value, limit.High!.Value.Value - Run.Samples.Joints[2][9_003]) * 180 / Math.PI,
            packed.Values("m2")[3]);
    }

    [Fact]
    public void Block_AtTheEnd_StopsAtTheLastSample() =>
        Assert.Equal(Run.Count, new Packed(SampleAnswers.Block(Material, Run.Count - 10, 256)).About.GetProperty("to").GetInt32());

    [Fact]
    public void Bins_StoredBins_ComeBackAsTheyAre()
    {
        var packed = new Packed(SampleAnswers.Bins(Run.Bins));
        Assert.Equal(Run.Bins.Edges, packed.Samples("edges"));
        Assert.Contains(Spike, packed.Samples("worst.AcrossPath"));
        Assert.Equal(Run.Bins.WorstUse.AsSpan()[..Run.Bins.BinCount].ToArray(), packed.Values("use.AcrossPath"));
    }

    [Fact]
    public void Scene_BetweenFrames_KeepsTheWorstUse()
    {
        var packed = new Packed(ScenePacker.Pack(Material));
        var frames = packed.Samples("frame");
        Assert.Equal(0, frames[0]);
        Assert.Equal(Run.Count - 1, frames[^1]);
        AssertClose(Run.Samples.Use[Criterion.AcrossPath].Where(u => !double.IsNaN(u)).Max(), packed.Values("use.AcrossPath").Where(u => !float.IsNaN(u)).Max());
        Assert.Equal(13, packed.About.GetProperty("marks").GetArrayLength());
    }

    private static void AssertClose(double expected, float actual) =>
        Assert.InRange(actual, expected - Math.Abs(expected) * RelativeFloat32, expected + Math.Abs(expected) * RelativeFloat32);
}
