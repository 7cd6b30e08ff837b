namespace PathPortal.Portal.Simulation;

/// <summary>How much a process keeps and computes for those who read runs.</summary>
public sealed record RunSampleCacheOptions
{
    /// <summary>Bytes of samples kept; a run of a minute takes about 8 MB.</summary>
    public long Capacity { get; init; } = 256L * 1024 * 1024;

    /// <summary>Longest run that is computed again for a page; a longer one would take too much of the memory others need.</summary>
    public int MostSamples { get; init; } = 1_000_000;

    /// <summary>Runs computed at the same time.</summary>
    public int AtOnce { get; init; } = Math.Max(1, Environment.ProcessorCount / 2);
}
