namespace PathPortal.Portal.Jobs;

/// <summary>What may differ from worker to worker.</summary>
public sealed record JobWorkerOptions
{
    /// <summary>Jobs computed at the same time, at least 2: one is always free for work that somebody waits for.</summary>
    public int Threads { get; init; } = Math.Max(2, Environment.ProcessorCount);

    /// <summary>How long a worker that is asked to end waits for its runs before it gives them back.</summary>
    public TimeSpan StopPatience { get; init; } = TimeSpan.FromSeconds(8);
}
