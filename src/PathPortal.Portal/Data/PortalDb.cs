using System.Data;
using Microsoft.EntityFrameworkCore;
using Npgsql;
using PathPortal.Portal.Domain;

namespace PathPortal.Portal.Data;

/// <summary>
/// The only source of contexts for what the portal does: one transaction per operation, the database knowing who acts. A transaction that
/// meets another is run again from the start with a fresh context, so work must not keep anything from an earlier try.
/// </summary>
public sealed class PortalDb(DbContextOptions<PortalDbContext> options, TimeProvider clock)
{
    private const int Tries = 6;

    /// <summary>Opens a transaction that the caller commits, or drops by disposing it.</summary>
    public Task<PortalSession> OpenAsync(Actor actor, CancellationToken cancellation = default) =>
        OpenAsync(actor, IsolationLevel.ReadCommitted, cancellation);

    /// <summary>Opens a transaction that only reads, and sees one moment throughout.</summary>
    public Task<PortalSession> OpenSnapshotAsync(Actor actor, CancellationToken cancellation = default) =>
        OpenAsync(actor, IsolationLevel.RepeatableRead, cancellation);

    /// <summary>Reads one moment, in a transaction that is never committed.</summary>
    public async Task<T> ReadAsync<T>(Actor actor, Func<PortalSession, Task<T>> read, CancellationToken cancellation = default)
    {
        await using var session = await OpenSnapshotAsync(actor, cancellation);
        return await read(session);
    }

    /// <summary>
    /// Does <paramref name="work"/> and commits when it succeeds; a refusal leaves nothing behind. Runs it again when another transaction came
    /// between, so that the refusal, if there is one, tells of what is there now.
    /// </summary>
    public async Task<Outcome<T>> ActAsync<T>(
        Actor actor, Func<PortalSession, Task<Outcome<T>>> work, CancellationToken cancellation = default)
        where T : notnull
    {
        for (var attempt = 1; ; attempt++)
        {
            string? transaction = null;
            Outcome<T>? outcome = null;
            try
            {
                await using var session = await OpenAsync(actor, cancellation);
                outcome = await work(session);
                if (!outcome.Succeeded)
                    return outcome;
                await session.FlushAsync(cancellation);
                transaction = session.TransactionId;
                await session.CommitAsync(cancellation);
                return outcome;
            }
            catch (Exception e) when (Conflicts.MayTryAgain(e) && attempt < Tries)
            {
                // The next try starts from what the other transaction left.
            }
            catch (Exception e) when (Conflicts.BrokenRule(e) is { } refusal)
            {
                return refusal;
            }
            catch (Exception e) when (Conflicts.MayTryAgain(e))
            {
                return new Refusal(RefusalKind.Stale, "Others are changing the same thing at this moment. Nothing was changed; please try again.");
            }
            catch (Exception e) when (transaction is not null && Conflicts.LostConnection(e))
            {
                // Whether the commit took place is known only to the database.
                if (await HasCommittedAsync(transaction, cancellation))
                    return outcome!;
                if (attempt >= Tries)
                    throw;
            }
        }
    }

    private async Task<PortalSession> OpenAsync(Actor actor, IsolationLevel isolation, CancellationToken cancellation)
    {
        var db = new PortalDbContext(options);
        try
        {
            var reading = isolation == IsolationLevel.RepeatableRead;
            if (reading)
                db.ChangeTracker.QueryTrackingBehavior = QueryTrackingBehavior.NoTracking;
            await db.Database.BeginTransactionAsync(isolation, cancellation);
            await db.Database.ExecuteSqlAsync(
                $"SELECT set_config('pathportal.actor', {actor.AccountId?.ToString() ?? actor.Name ?? ""}, true)", cancellation);
            return new PortalSession(db, actor, clock, reading);
        }
        catch
        {
            await db.DisposeAsync();
            throw;
        }
    }

    private async Task<bool> HasCommittedAsync(string transaction, CancellationToken cancellation)
    {
        await using var db = new PortalDbContext(options);
        var connection = (NpgsqlConnection)db.Database.GetDbConnection();
        await connection.OpenAsync(cancellation);
        while (true)
        {
            await using var command = new NpgsqlCommand("SELECT pg_xact_status($1::xid8)", connection);
            command.Parameters.Add(new() { Value = transaction });
            var status = await command.ExecuteScalarAsync(cancellation) as string;
            if (status != "in progress")
                return status == "committed";
            await Task.Delay(TimeSpan.FromMilliseconds(50), clock, cancellation);
        }
    }
}
