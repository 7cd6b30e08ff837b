using Microsoft.EntityFrameworkCore;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain.Runs;

namespace PathPortal.Portal.Jobs;

/// <summary>Tells the pages, and the other workers, that this worker is alive.</summary>
internal sealed class WorkerHeartbeat(PortalDb db, WorkerIdentity worker)
{
    public static readonly TimeSpan Interval = TimeSpan.FromSeconds(10);

    /// <summary>Rows of workers that were not seen for this long are removed.</summary>
    private static readonly TimeSpan Forgotten = TimeSpan.FromDays(1);

    private readonly Actor _actor = Actor.Process("worker " + worker.Name);

    public async Task BeatAsync(CancellationToken cancellation)
    {
        await using var session = await db.OpenAsync(_actor, cancellation);
        var name = worker.Name;
        await session.Db.Database.ExecuteSqlAsync(
            $"""
            INSERT INTO workers (name, started_at, last_seen_at) VALUES ({name}, {session.Now}, {session.Now})
            ON CONFLICT (name) DO UPDATE SET last_seen_at = excluded.last_seen_at
            """,
            cancellation);
        var forgotten = session.Now - Forgotten;
        await session.Db.Workers.Where(w => w.LastSeenAt < forgotten).ExecuteDeleteAsync(cancellation);
        await session.CommitAsync(cancellation);
    }

    /// <summary>At an orderly end.</summary>
    public async Task EndAsync(CancellationToken cancellation)
    {
        await using var session = await db.OpenAsync(_actor, cancellation);
        var name = worker.Name;
        await session.Db.Workers.Where(w => w.Name == name).ExecuteDeleteAsync(cancellation);
        await session.CommitAsync(cancellation);
    }

    /// <summary>How many workers were seen within <see cref="WorkerPresence.Absent"/>.</summary>
    public static Task<int> CountPresentAsync(PortalSession session, CancellationToken cancellation = default)
    {
        var since = session.Now - WorkerPresence.Absent;
        return session.Db.Workers.CountAsync(w => w.LastSeenAt > since, cancellation);
    }
}
