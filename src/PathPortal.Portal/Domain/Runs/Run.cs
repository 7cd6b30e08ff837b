using PathPortal.Engine.Verdicts;

namespace PathPortal.Portal.Domain.Runs;

/// <summary>
/// One simulation, unique per plant and digest of its inputs. Requests that come to the same inputs share it. A job may run twice; the
/// first result stays.
/// </summary>
public sealed class Run
{
    public const int MaxBinBytes = 64 * 1024;
    public const int MaxAttempts = 5;

    public Run(Guid plantId, string digest, int numericsVersion, DateTimeOffset at)
    {
        Id = Guid.CreateVersion7(at);
        PlantId = plantId;
        Digest = digest;
        NumericsVersion = numericsVersion;
        QueuedAt = at;
    }

    private Run()
    {
    }

    public Guid Id { get; private set; }

    public Guid PlantId { get; private set; }

    /// <summary>The scenario's digest, hexadecimal.</summary>
    public string Digest { get; private set; } = "";

    public int NumericsVersion { get; private set; }

    public RunState State { get; private set; } = RunState.Queued;

    /// <summary>0..1 while running.</summary>
    public double Progress { get; private set; }

    /// <summary>The worker that computes or computed it.</summary>
    public string? WorkerName { get; private set; }

    /// <summary>How often a worker took it; a worker's result counts only while this is still the number it took it under.</summary>
    public int Attempts { get; private set; }

    /// <summary>The job that is to compute it, together with the other runs of the batch; null before it was given to one.</summary>
    public Guid? BatchId { get; private set; }

    public DateTimeOffset QueuedAt { get; private set; }

    public DateTimeOffset? StartedAt { get; private set; }

    public DateTimeOffset? FinishedAt { get; private set; }

    public Verdict? Verdict { get; private set; }

    /// <summary>Largest use over the binding criteria, 1 = at the limit, infinite as in the engine; null where none could be judged.</summary>
    public double? WorstUse { get; private set; }

    public Criterion? WorstCriterion { get; private set; }

    /// <summary>Seconds from first to last sample.</summary>
    public double? CycleTime { get; private set; }

    /// <summary>The summary as JSON, findings included; null until done.</summary>
    public string? SummaryJson { get; private set; }

    /// <summary>Worst use per criterion and bin, packed; at most <see cref="MaxBinBytes"/>. Large: lists must not select it.</summary>
    public byte[]? Bins { get; private set; }

    public string? Error { get; private set; }

    public uint Version { get; private set; }

    public bool IsFinished => State is RunState.Done or RunState.Failed;

    /// <summary>Gives the run to a job; the one it had before finds it no longer.</summary>
    public void JoinBatch(Guid batchId)
    {
        if (!IsFinished)
            BatchId = batchId;
    }

    /// <summary>Takes the run for a worker; false when it is finished already. A running one is taken over: its worker was lost.</summary>
    public bool Start(string workerName, DateTimeOffset at)
    {
        if (IsFinished)
            return false;
        State = RunState.Running;
        WorkerName = workerName;
        StartedAt = at;
        Progress = 0;
        Attempts++;
        return true;
    }

    public void Advance(double progress)
    {
        if (State == RunState.Running && progress >= Progress && progress <= 1)
            Progress = progress;
    }

    /// <summary>Keeps a result; false when one is there already.</summary>
    public bool Complete(RunConclusion conclusion, DateTimeOffset at)
    {
        if (IsFinished)
            return false;
        if (conclusion.Bins is { Length: > MaxBinBytes })
            throw new ArgumentException($"Bins take {conclusion.Bins.Length} bytes; at most {MaxBinBytes} fit.", nameof(conclusion));
        State = RunState.Done;
        Progress = 1;
        FinishedAt = at;
        Verdict = conclusion.Verdict;
        WorstUse = conclusion.WorstUse;
        WorstCriterion = conclusion.WorstCriterion;
        CycleTime = conclusion.CycleTime;
        SummaryJson = conclusion.SummaryJson;
        Bins = conclusion.Bins;
        Error = null;
        return true;
    }

    /// <summary>Gives up on the run; false when it is finished already.</summary>
    public bool Fail(string error, DateTimeOffset at)
    {
        if (IsFinished)
            return false;
        State = RunState.Failed;
        FinishedAt = at;
        Error = error;
        return true;
    }

    /// <summary>Puts a run back that a worker could not finish, or one that failed and is to be tried again.</summary>
    public bool Requeue(DateTimeOffset at)
    {
        if (State is RunState.Done or RunState.Queued)
            return false;
        if (State == RunState.Failed)
            Attempts = 0;
        State = RunState.Queued;
        QueuedAt = at;
        StartedAt = FinishedAt = null;
        WorkerName = null;
        Progress = 0;
        Error = null;
        return true;
    }
}
