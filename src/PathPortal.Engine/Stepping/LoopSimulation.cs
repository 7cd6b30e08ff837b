using System.Collections.Immutable;
using System.Globalization;
using PathPortal.Engine.Control;
using PathPortal.Engine.Paths;
using PathPortal.Engine.Postures;

namespace PathPortal.Engine.Stepping;

/// <summary>
/// Up to <see cref="ILane{T}.Width"/> simulations of one scenario side by side, each from a start posture of its own. Each lane's numbers depend on
/// nothing but its own start. Not safe between threads.
/// </summary>
internal sealed unsafe class LoopSimulation<T>
    where T : unmanaged, ILane<T>
{
    // Standing still for this long (s) under a path rate below the share, the controller will not move again.
    private const double StandstillTime = 2;
    private const double StandstillRate = 1e-3;
    private const int ReportEvery = 1024;

    // After the reference has come to rest the arm is followed until it has too: within these errors, or ten time constants of loop and servo.
    private const double SettledDistance = 1e-5; // m
    private const double SettledTurn = 1e-4; // rad
    private const double LongestSettling = 5; // s

    private readonly Scenario scenario;
    private readonly LoopSetup setup;
    private readonly LoopWorkspace<T> w;
    private readonly ReferenceWriter<T> writer;
    private readonly ReferenceCursor[] cursors;
    private readonly LaneOutcome?[] outcomes;
    private readonly double[] behind;
    private readonly int[] standstill;
    private readonly int[] settling;
    private readonly int settlingSteps;

    /// <param name="starts">Start postures (rad or m), one to <see cref="ILane{T}.Width"/>.</param>
    public LoopSimulation(Scenario scenario, LoopSetup setup, PathPlan plan, PostureFinder finder, IReadOnlyList<ImmutableArray<double>> starts)
    {
        (this.scenario, this.setup) = (scenario, setup);
        w = new(setup);
        writer = new(scenario, w);
        cursors = [.. starts.Select(start => new ReferenceCursor(scenario, plan, finder, start))];
        outcomes = new LaneOutcome?[starts.Count];
        (behind, standstill, settling) = (new double[starts.Count], new int[starts.Count], new int[starts.Count]);
        settlingSteps = SettlingSteps(scenario.Controller);
        for (var lane = 0; lane < T.Width; lane++)
        {
            // Lanes without a simulation repeat the first one's start; nothing reads them.
            Place(lane, starts[lane < starts.Count ? lane : 0]);
        }
    }

    /// <summary>Runs every lane to its end and records it.</summary>
    public LaneOutcome[] Run(LoopTrace trace, IProgress<double>? progress, CancellationToken cancellation)
    {
        for (var step = 0; ; step++)
        {
            if (step % ReportEvery == 0)
            {
                cancellation.ThrowIfCancellationRequested();
                progress?.Report(cursors.Select((c, lane) => outcomes[lane] is null ? c.ShareAt(Time(step, lane)) : 1).Average());
            }

            WriteReferences(step);
            var acting = Step(step);
            trace.Record(w, step);
            if (EndLanes(step))
            {
                return Array.ConvertAll(outcomes, o => o!.Value);
            }

            ServoStage.Advance(setup, w, acting);
        }
    }

    private T* Step(int step)
    {
        var seen = Seen(step);
        KinematicsStage.Run(setup, w.Joints, w.True);
        var frames = seen == w.Joints ? w.True : w.Loop;
        if (seen != w.Joints)
        {
            KinematicsStage.Run(setup, seen, frames);
        }

        TaskStage.TrueErrors(w);
        TaskStage.Run(setup, w, frames);
        JacobiStage.Run(setup, w);
        SolveStage.Run(setup, w, seen);
        LimitStage.Run(setup, w);
        return ServoStage.Act(setup, w, step);
    }

    // The joint values the controller works with.
    private T* Seen(int step)
    {
        if (setup.Controller.Feedback == FeedbackSource.Commanded)
        {
            return w.Commanded;
        }

        return setup.Controller.MeasurementDelay == 0 ? w.Joints : ServoStage.Measure(setup, w, step);
    }

    private void WriteReferences(int step)
    {
        var n = setup.JointCount;
        Span<double> seen = stackalloc double[n];
        for (var lane = 0; lane < cursors.Length; lane++)
        {
            if (outcomes[lane] is not null)
            {
                continue;
            }

            ReadSeen(lane, seen);
            var (cursor, time) = (cursors[lane], Time(step, lane));
            cursor.Advance(time, seen);
            if (lane > 0 && outcomes[lane - 1] is null && cursor.IsSameAs(cursors[lane - 1], time, Time(step, lane - 1)))
            {
                writer.CopyFromLaneBefore(lane);
            }
            else if (cursor.Failure is null)
            {
                writer.Write(lane, cursor, time);
            }
        }
    }

    private double Time(int step, int lane) => step * setup.Controller.Period - behind[lane];

    private void ReadSeen(int lane, Span<double> seen)
    {
        var from = setup.Controller.Feedback == FeedbackSource.Commanded ? w.Commanded : w.Joints;
        for (var i = 0; i < seen.Length; i++)
        {
            seen[i] = LoopWorkspace<T>.At(from + i, lane);
        }
    }

    // Looks at what the step brought to each lane; true once all have ended.
    private bool EndLanes(int step)
    {
        var running = 0;
        for (var lane = 0; lane < cursors.Length; lane++)
        {
            if (outcomes[lane] is null && EndOf(lane, step) is { } ended)
            {
                outcomes[lane] = ended;
            }

            running += outcomes[lane] is null ? 1 : 0;
        }

        return running == 0;
    }

    private LaneOutcome? EndOf(int lane, int step)
    {
        var cursor = cursors[lane];
        LaneOutcome Ended(RunEnd end, string? reason) => new(end, step + 1, reason, cursor.EndTime);
        if (cursor.Failure is { } failure)
        {
            // Nothing was asked of the arm at this sample, so it is none.
            return new(RunEnd.Unreachable, step, failure, cursor.EndTime);
        }

        if (LoopWorkspace<T>.IsSet(w.NotFinite, lane))
        {
            return Ended(RunEnd.NotFinite, Text(lane, step, $"A value was not finite"));
        }

        if (LoopWorkspace<T>.IsSet(w.Singular, lane))
        {
            return Ended(RunEnd.Singular, Text(lane, step, $"The undamped inverse passed condition {LoopSetup.LargestCondition:0e0}: singular"));
        }

        if (LoopWorkspace<T>.IsSet(w.BeyondLimit, lane))
        {
            return Ended(RunEnd.StoppedAtLimit, Text(lane, step, $"The controller stopped at a joint limit"));
        }

        if (cursor.Finished && (IsSettled(lane) || ++settling[lane] > settlingSteps))
        {
            return Ended(RunEnd.Completed, null);
        }

        var rate = LoopWorkspace<T>.At(w.PathRate, lane);
        behind[lane] += (1 - rate) * setup.Controller.Period;
        standstill[lane] = rate < StandstillRate ? standstill[lane] + 1 : 0;
        if (standstill[lane] * setup.Controller.Period > StandstillTime)
        {
            return Ended(RunEnd.StoodStill, Text(lane, step, $"The controller slowed the path until it stood still"));
        }

        return step + 1 >= ScenarioCheck.MostSamples
            ? Ended(RunEnd.TooLong, Text(lane, step, $"The run was cut off at {ScenarioCheck.MostSamples} samples"))
            : null;
    }

    private bool IsSettled(int lane) => LoopWorkspace<T>.At(w.TrueDistance, lane) <= SettledDistance
        && LoopWorkspace<T>.At(w.TrueTurn, lane) <= SettledTurn;

    private static int SettlingSteps(ControllerSettings controller)
    {
        var slowest = Math.Min(controller.PositionGain, controller.OrientationGain);
        if (!(slowest > 0))
        {
            return 0;
        }

        var delay = (controller.MeasurementDelay + controller.CommandDelay) * controller.Period;
        return (int)(Math.Min(10 / slowest + 10 * controller.ServoTimeConstant + delay, LongestSettling) / controller.Period);
    }

    private string Text(int lane, int step, FormattableString what)
    {
        var waypoint = (int)LoopWorkspace<T>.At(w.Echo + LoopTrace.EchoWaypoint, lane) + 1;
        return string.Create(
            CultureInfo.InvariantCulture,
            $"{FormattableString.Invariant(what)} after {step * setup.Controller.Period:0.###} s, on the way to waypoint {waypoint}.");
    }

    private void Place(int lane, ImmutableArray<double> start)
    {
        var n = setup.JointCount;
        for (var i = 0; i < n; i++)
        {
            LoopWorkspace<T>.At(w.Joints + i, lane) = start[i];
            LoopWorkspace<T>.At(w.Commanded + i, lane) = start[i];
            for (var slot = 0; slot < w.MeasurementSlots; slot++)
            {
                LoopWorkspace<T>.At(w.MeasurementRing + slot * n + i, lane) = start[i];
            }
        }
    }
}
