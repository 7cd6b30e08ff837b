using System.Collections.Immutable;
using System.Globalization;
using PathPortal.Engine.Control;
using PathPortal.Engine.Paths;
using PathPortal.Engine.Postures;
using PathPortal.Engine.Stepping;
using PathPortal.Engine.Verdicts;

namespace PathPortal.Engine;

/// <summary>
/// Simulates a scenario: every start posture follows the path under the cell's controller, each is judged by the criteria, the best one is the result.
/// The same scenario gives the same bits on every x64 machine. Safe from any thread; one call works on one thread.
/// </summary>
public static class Simulator
{
    /// <summary>Runs a scenario to its verdict.</summary>
    /// <param name="keepSamples">Return every sample of the chosen posture, not only summary and bins.</param>
    /// <param name="progress">Told a share 0..1 now and then, on the calling thread.</param>
    /// <returns>
    /// Always a result: a scenario that can't be run (numbers out of range, a path that can't be planned, a first waypoint out of reach) fails with the
    /// reasons as outcomes and remarks, without samples.
    /// </returns>
    /// <exception cref="OperationCanceledException">The token was cancelled.</exception>
    public static RunResult Run(
        Scenario scenario, bool keepSamples = false, IProgress<double>? progress = null, CancellationToken cancellation = default)
    {
        ArgumentNullException.ThrowIfNull(scenario);
        var problems = ScenarioCheck.Find(scenario);
        if (!problems.IsEmpty)
        {
            return NotRun(scenario, reachable: null, [.. problems.Select(p => Sentence(p.ToString()))]);
        }

        var plan = PathPlanner.Plan(scenario.Path, scenario.Arm, scenario.Controller);
        if (!plan.Problems.IsEmpty)
        {
            return NotRun(scenario, reachable: null, [.. plan.Problems.Select(p => Sentence(p.ToString()))]);
        }

        var starts = StartPostures.Find(scenario);
        return starts.Reason is { } reason
            ? NotRun(scenario, reachable: false, [reason, .. plan.Remarks])
            : Best(scenario, plan, starts, keepSamples, progress, cancellation);
    }

    private static RunResult Best(
        Scenario scenario, PathPlan plan, StartPostures starts, bool keepSamples, IProgress<double>? progress, CancellationToken cancellation)
    {
        var finder = new PostureFinder(scenario.Arm, scenario.Cell.ToolInFlange);
        var runs = new PostureRuns(scenario, plan, finder);
        var turns = WholeTurns.Of(scenario, plan, [.. starts.Starts.Select(s => s.Joints)]);
        var outcomes = new PostureOutcome[starts.Starts.Length];
        (PostureRun Run, Judgement Judgement)? best = null;
        foreach (var simulated in runs.All([.. turns.Simulated.Select(i => starts.Starts[i].Joints)], progress, cancellation))
        {
            var missed = Reachability.Missed(scenario, plan, finder, simulated.Samples);
            foreach (var run in turns.Expand(simulated))
            {
                var judgement = Judgement.Of(scenario, run.Samples, Facts(scenario, run, missed));
                var start = starts.Starts[run.Index];
                outcomes[run.Index] = new(
                    start.Joints, start.Description, judgement.Verdict, judgement.WorstUse, judgement.WorstCriterion, Chosen: false);
                var order = best is null ? -1 : PostureRanking.Instance.Compare(judgement, best.Value.Judgement);
                if (order < 0 || (order == 0 && run.Index < best!.Value.Run.Index))
                {
                    best = (run, judgement);
                }
            }
        }

        var (chosen, verdict) = best!.Value;
        outcomes[chosen.Index] = outcomes[chosen.Index] with { Chosen = true };
        progress?.Report(1);
        return new(Summary(scenario, plan, starts, outcomes, chosen, verdict), verdict.Bins(), keepSamples ? chosen.Samples : null);
    }

    private static RunSummary Summary(
        Scenario scenario, PathPlan plan, StartPostures starts, PostureOutcome[] postures, PostureRun chosen, Judgement verdict)
    {
        var (findings, leftOut) = verdict.Findings();
        return new()
        {
            NumericsVersion = NumericsVersion.Current,
            Verdict = verdict.Verdict,
            Outcomes = verdict.Outcomes,
            Findings = findings,
            Postures = [.. postures],
            PostureChoice = Choice(scenario, postures, chosen.Index),
            SampleCount = chosen.Samples.Count,
            Period = scenario.Controller.Period,
            CycleTime = Math.Max(0, chosen.Samples.Count - 1) * scenario.Controller.Period,
            PlannedTime = chosen.Outcome.PlannedTime,
            PathLength = chosen.Length,
            CharacteristicLength = scenario.Arm.CharacteristicLength,
            Extremes = verdict.Extremes(),
            Remarks = [.. Remarks(scenario, plan, starts, leftOut)],
        };
    }

    private static IEnumerable<string> Remarks(Scenario scenario, PathPlan plan, StartPostures starts, int findingsLeftOut)
    {
        foreach (var remark in plan.Remarks)
        {
            yield return remark;
        }

        if (starts.LeftOut > 0)
        {
            yield return string.Create(
                CultureInfo.InvariantCulture, $"{starts.LeftOut} more start postures, nearer to their position limits, were not simulated.");
        }

        if (findingsLeftOut > 0)
        {
            yield return string.Create(CultureInfo.InvariantCulture, $"{findingsLeftOut} further findings, less severe, are not listed.");
        }

        yield return "Loop soundness is judged by the sampled loop of gain, servo lag and delay.";
        if (scenario.Controller.LimitReaction == LimitReaction.SlowPath)
        {
            yield return "Joint speed demands are those at the programmed pace; the controller slows the path where they pass the limits.";
        }
    }

    private static string Choice(Scenario scenario, PostureOutcome[] postures, int chosen)
    {
        if (scenario.Start is not null)
        {
            return "The start posture is given.";
        }

        var passing = postures.Count(p => p.Verdict == Verdict.Pass);
        return postures.Length == 1
            ? $"The only posture that reaches the first waypoint: {postures[0].Description}."
            : string.Create(
                CultureInfo.InvariantCulture,
                $"{passing} of {postures.Length} start postures pass; {postures[chosen].Description} has the lowest worst use of a limit.");
    }

    private static RunFacts Facts(Scenario scenario, PostureRun run, string? missed)
    {
        var (sound, reason) = LoopSoundness.Judge(scenario.Controller);
        var completed = run.Outcome.End == RunEnd.Completed;
        var unreachable = run.Outcome.End == RunEnd.Unreachable ? run.Outcome.Reason : missed;
        return new()
        {
            Finished = completed,
            NotFinishedReason = completed ? null : run.Outcome.Reason,
            Reachable = unreachable is not null ? false : completed ? true : null,
            NotReachableReason = unreachable,
            LoopSound = sound,
            NotSoundReason = reason,
        };
    }

    private static RunResult NotRun(Scenario scenario, bool? reachable, ImmutableArray<string> reasons)
    {
        var judgement = Judgement.WithoutSamples(scenario, new()
        {
            Finished = false,
            NotFinishedReason = reasons[0],
            Reachable = reachable,
            NotReachableReason = reachable == false ? reasons[0] : null,
            LoopSound = null,
        });
        return new(
            new()
            {
                NumericsVersion = NumericsVersion.Current,
                Verdict = judgement.Verdict,
                Outcomes = judgement.Outcomes,
                Findings = [],
                Postures = [],
                PostureChoice = "Nothing was simulated.",
                SampleCount = 0,
                Period = scenario.Controller.Period,
                CycleTime = 0,
                PlannedTime = 0,
                PathLength = 0,
                CharacteristicLength = scenario.Arm.CharacteristicLength,
                Extremes = judgement.Extremes(),
                Remarks = reasons,
            },
            null,
            null);
    }

    private static string Sentence(string text) => char.ToUpperInvariant(text[0]) + text[1..] + ".";
}
