namespace PathPortal.Portal.Domain.Runs;

/// <summary>When a worker was last seen.</summary>
public sealed class WorkerPresence
{
    /// <summary>Pages say that no worker is at work when none was seen for this long.</summary>
    public static readonly TimeSpan Absent = TimeSpan.FromSeconds(30);

    public WorkerPresence(string name, DateTimeOffset at)
    {
        Name = name;
        StartedAt = at;
        LastSeenAt = at;
    }

    private WorkerPresence()
    {
    }

    /// <summary>Unique per process.</summary>
    public string Name { get; private set; } = "";

    public DateTimeOffset StartedAt { get; private set; }

    public DateTimeOffset LastSeenAt { get; private set; }

    public void Seen(DateTimeOffset at) => LastSeenAt = at;
}
