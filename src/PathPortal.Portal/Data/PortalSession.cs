using System.Data.Common;
using Microsoft.EntityFrameworkCore;
using Microsoft.EntityFrameworkCore.Storage;
using PathPortal.Portal.Domain.History;
using PathPortal.Portal.Domain.People;

namespace PathPortal.Portal.Data;

/// <summary>One operation: a context in its transaction, who acts, and what is to be told in the history. Not thread-safe.</summary>
public sealed class PortalSession : IAsyncDisposable
{
    private readonly List<HistoryDraft> _drafts = [];
    private readonly List<Func<DbTransaction, CancellationToken, Task>> _lastSteps = [];
    private readonly bool _reading;
    private Access? _access;
    private bool _flushed;

    internal PortalSession(PortalDbContext db, Actor actor, TimeProvider clock, bool reading)
    {
        _reading = reading;
        Db = db;
        Actor = actor;
        Now = Microseconds(clock.GetUtcNow());
    }

    public PortalDbContext Db { get; }

    public Actor Actor { get; }

    /// <summary>The moment of the operation, to the microsecond the database keeps.</summary>
    public DateTimeOffset Now { get; }

    /// <summary>The database's number of this transaction, once it wrote something.</summary>
    internal string? TransactionId { get; private set; }

    /// <summary>
    /// What the acting account may do, read in this transaction and locked unless it only reads: a role taken away or an account disabled at
    /// the same time waits, or is seen. An account that is gone has no rights.
    /// </summary>
    public async Task<Access> AccessAsync(CancellationToken cancellation = default)
    {
        if (_access is not null)
            return _access;
        var id = Actor.AccountId ?? throw new InvalidOperationException($"{Actor} is no account and has no rights of its own.");
        var accounts = _reading ? Db.Users.Where(a => a.Id == id) : Db.Users.FromSql($"SELECT * FROM accounts WHERE id = {id} FOR SHARE");
        var account = await accounts.AsNoTracking().SingleOrDefaultAsync(cancellation);
        var given = _reading
            ? Db.PlantRoles.Where(r => r.AccountId == id)
            : Db.PlantRoles.FromSql($"SELECT * FROM plant_roles WHERE account_id = {id} FOR SHARE");
        var roles = await given.AsNoTracking().Select(r => new { r.PlantId, r.Role }).ToListAsync(cancellation);
        return _access = account is null
            ? new Access(id, "", false, false, [])
            : new Access(id, account.DisplayName, account.DisabledAt is null, account.AdministersCompany, roles.Select(r => (r.PlantId, r.Role)));
    }

    /// <summary>Tells something in the history, in this transaction, as its last act. One entry for a batch.</summary>
    public void Tell(HistoryDraft draft) => _drafts.Add(draft);

    /// <summary>Adds a short step on the open transaction, after the changes are written and before the history: the job engine enlists here.</summary>
    public void BeforeHistory(Func<DbTransaction, CancellationToken, Task> step) => _lastSteps.Add(step);

    /// <summary>Writes everything, history last, and commits.</summary>
    public async Task CommitAsync(CancellationToken cancellation = default)
    {
        if (_reading)
            throw new InvalidOperationException("A session that only reads is not committed.");
        await FlushAsync(cancellation);
        await Db.Database.CommitTransactionAsync(cancellation);
    }

    public ValueTask DisposeAsync() => Db.DisposeAsync();

    internal async Task FlushAsync(CancellationToken cancellation)
    {
        if (_flushed)
            return;
        await Db.SaveChangesAsync(cancellation);
        var transaction = Db.Database.CurrentTransaction!.GetDbTransaction();
        foreach (var step in _lastSteps)
            await step(transaction, cancellation);
        if (_drafts.Count > 0)
            await AppendHistoryAsync(cancellation);
        TransactionId = await Db.Database
            .SqlQuery<string>($"SELECT pg_current_xact_id_if_assigned()::text AS \"Value\"").SingleOrDefaultAsync(cancellation);
        _flushed = true;
    }

    private async Task AppendHistoryAsync(CancellationToken cancellation)
    {
        var name = Actor.Name ?? (await AccessAsync(cancellation)).DisplayName;
        var head = await Db.HistoryHead.FromSql($"SELECT * FROM history_head WHERE id = 1 FOR UPDATE").AsTracking().SingleAsync(cancellation);
        foreach (var draft in _drafts)
            Db.History.Add(HistoryChain.Append(head, draft, Actor.AccountId, name, Now));
        await Db.SaveChangesAsync(cancellation);
    }

    private static DateTimeOffset Microseconds(DateTimeOffset at) => new(at.UtcTicks - (at.UtcTicks % TimeSpan.TicksPerMicrosecond), TimeSpan.Zero);
}
