using System.Collections.Immutable;
using System.Runtime.Intrinsics;
using PathPortal.Engine.Paths;
using PathPortal.Engine.Postures;

namespace PathPortal.Engine.Stepping;

/// <summary>One simulated start posture.</summary>
/// <param name="Index">Its place among the starts.</param>
/// <param name="Length">Tool travel of the whole path as this arm makes it (m).</param>
internal sealed record PostureRun(int Index, LaneOutcome Outcome, RunSamples Samples, double Length);

/// <summary>Runs all start postures of a scenario, in groups as wide as the machine's registers.</summary>
internal sealed class PostureRuns(Scenario scenario, PathPlan plan, PostureFinder finder)
{
    private readonly LoopSetup setup = new(scenario.Arm, scenario.Cell.ToolInFlange, scenario.Controller);

    /// <summary>The runs in the order of the starts, one group simulated at a time.</summary>
    public IEnumerable<PostureRun> All(IReadOnlyList<ImmutableArray<double>> starts, IProgress<double>? progress, CancellationToken cancellation)
    {
        for (var first = 0; first < starts.Count;)
        {
            var left = starts.Count - first;
            var width = Width(left);
            var group = starts.Skip(first).Take(Math.Min(width, left)).ToList();
            using var trace = new LoopTrace(setup.JointCount, width);
            var outcomes = Run(width, group, trace, Part(progress, first, group.Count, starts.Count), cancellation);
            for (var lane = 0; lane < group.Count; lane++)
            {
                cancellation.ThrowIfCancellationRequested();
                var (samples, length) = SampleReader.Read(scenario, plan, trace, lane, outcomes[lane].Count);
                yield return new(first + lane, outcomes[lane], samples, length);
            }

            first += group.Count;
        }
    }

    /// <summary>Lanes for a number of simulations: no wider than needed, no wider than the machine.</summary>
    public static int Width(int simulations) => simulations switch
    {
        1 => 1,
        2 => 2,
        <= 4 => 4,
        _ => Vector512.IsHardwareAccelerated ? 8 : 4,
    };

    /// <summary>One group at a given width.</summary>
    internal LaneOutcome[] Run(
        int width, IReadOnlyList<ImmutableArray<double>> starts, LoopTrace trace, IProgress<double>? progress, CancellationToken cancellation) => width switch
        {
            1 => new LoopSimulation<ScalarLane>(scenario, setup, plan, finder, starts).Run(trace, progress, cancellation),
            2 => new LoopSimulation<Lane128>(scenario, setup, plan, finder, starts).Run(trace, progress, cancellation),
            4 => new LoopSimulation<Lane256>(scenario, setup, plan, finder, starts).Run(trace, progress, cancellation),
            8 => new LoopSimulation<Lane512>(scenario, setup, plan, finder, starts).Run(trace, progress, cancellation),
            _ => throw new ArgumentOutOfRangeException(nameof(width), width, "Lanes come by 1, 2, 4 and 8."),
        };

    private static PartProgress? Part(IProgress<double>? progress, int first, int count, int all) =>
        progress is null ? null : new(progress, (double)first / all, (double)count / all);

    private sealed class PartProgress(IProgress<double> whole, double begin, double size) : IProgress<double>
    {
        public void Report(double value) => whole.Report(begin + size * value);
    }
}
