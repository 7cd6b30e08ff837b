using System.Collections.Immutable;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Paths;

namespace PathPortal.Engine.Stepping;

/// <summary>
/// Start postures that differ by whole turns of revolute joints move the same way, joint for joint, that many turns apart: sine and cosine don't know
/// turns. One of them is simulated, the others are read off. Not where something does know turns: the pull to mid-range, or a joint move, whose end
/// is looked for nearby.
/// </summary>
internal sealed class WholeTurns
{
    // Postures of one branch come from one solution and whole turns added to it.
    private const double TurnTolerance = 1e-9; // rad

    private readonly IReadOnlyList<ImmutableArray<double>> starts;
    private readonly List<List<int>> groups;

    private WholeTurns(IReadOnlyList<ImmutableArray<double>> starts, List<List<int>> groups) => (this.starts, this.groups) = (starts, groups);

    /// <summary>Indices of the starts to simulate, one of each group.</summary>
    public IEnumerable<int> Simulated => groups.Select(g => g[0]);

    public static WholeTurns Of(Scenario scenario, PathPlan plan, IReadOnlyList<ImmutableArray<double>> starts)
    {
        var apart = scenario.Controller.MidRangeGain != 0 || plan.Moves.Any(m => m is JointMove);
        var groups = new List<List<int>>();
        for (var i = 0; i < starts.Count; i++)
        {
            var same = apart ? null : groups.Find(g => DifferByTurns(scenario.Arm, starts[g[0]], starts[i]));
            if (same is null)
            {
                groups.Add([i]);
            }
            else
            {
                same.Add(i);
            }
        }

        return new(starts, groups);
    }

    /// <summary>The simulated run and those that differ from it by whole turns, by the index of their start.</summary>
    /// <param name="simulated">A run of <see cref="Simulated"/>, its index the place there.</param>
    public IEnumerable<PostureRun> Expand(PostureRun simulated)
    {
        var group = groups[simulated.Index];
        foreach (var i in group)
        {
            var samples = i == group[0] ? simulated.Samples : Turned(simulated.Samples, starts[group[0]], starts[i]);
            yield return simulated with { Index = i, Samples = samples };
        }
    }

    private static RunSamples Turned(RunSamples samples, ImmutableArray<double> from, ImmutableArray<double> to) => samples with
    {
        Joints =
        [
            .. samples.Joints.Select((column, joint) =>
            {
                var turns = to[joint] - from[joint];
                return Math.Abs(turns) < 1 ? column : Array.ConvertAll(column, q => q + turns);
            }),
        ],
    };

    private static bool DifferByTurns(ArmModel arm, ImmutableArray<double> a, ImmutableArray<double> b)
    {
        for (var i = 0; i < a.Length; i++)
        {
            var turns = arm.Joints[i].Kind == JointKind.Revolute ? Math.Round((b[i] - a[i]) / (2 * Math.PI)) : 0;
            if (!(Math.Abs(b[i] - a[i] - 2 * Math.PI * turns) <= TurnTolerance))
            {
                return false;
            }
        }

        return true;
    }
}
