using Microsoft.EntityFrameworkCore;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain.History;

namespace PathPortal.Portal.Handling.History;

/// <summary>Follows the whole chain as it is stored.</summary>
public sealed class VerifyHistory(PortalDb db)
{
    /// <param name="checkpoints">Hashes by sequence from records kept elsewhere; null for none.</param>
    public async Task<HistoryReport> HandleAsync(
        Actor actor, IReadOnlyDictionary<long, string>? checkpoints = null, CancellationToken cancellation = default)
    {
        // One snapshot for head and entries, or an entry appended meanwhile would look like a fault.
        await using var session = await db.OpenSnapshotAsync(actor, cancellation);
        var verifier = new HistoryVerifier(checkpoints);
        var head = await session.Db.HistoryHead.SingleOrDefaultAsync(cancellation);
        await foreach (var entry in session.Db.History.OrderBy(e => e.Sequence).AsAsyncEnumerable().WithCancellation(cancellation))
        {
            if (!verifier.Take(entry))
                break;
        }
        var found = verifier.Finish(head);
        return new(verifier.Count, verifier.LastHash, found);
    }
}
