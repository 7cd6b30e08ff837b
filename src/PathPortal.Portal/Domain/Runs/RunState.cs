namespace PathPortal.Portal.Domain.Runs;

/// <summary>Where a run stands.</summary>
public enum RunState
{
    Queued,
    Running,

    /// <summary>It has a verdict, which may well be a failed one.</summary>
    Done,

    /// <summary>No result could be computed; <see cref="Run.Error"/> says why.</summary>
    Failed,
}
