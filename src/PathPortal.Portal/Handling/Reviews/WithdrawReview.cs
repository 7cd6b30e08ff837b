using Microsoft.EntityFrameworkCore;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.History;
using PathPortal.Portal.Domain.People;
using PathPortal.Portal.Domain.Reviews;

namespace PathPortal.Portal.Handling.Reviews;

/// <summary>Takes a revision out of review, or out of use, on one cell. Those who submit may, and those who approve.</summary>
public sealed class WithdrawReview(PortalDb db)
{
    private const string What = "review";

    /// <returns>The state the review is in afterwards.</returns>
    public async Task<Outcome<ReviewState>> HandleAsync(Actor actor, Guid reviewId, string why, CancellationToken cancellation = default)
    {
        var noted = Names.Note(why);
        if (!noted.Succeeded)
            return noted.Refusal;
        return await db.ActAsync<ReviewState>(actor, async session =>
        {
            var access = await session.AccessAsync(cancellation);
            var review = await session.Db.Reviews.SingleOrDefaultAsync(r => r.Id == reviewId, cancellation);
            if (review is null)
                return Refusal.NotFound(What);
            if (access.Refuse(review.PlantId, Right.Read, What) is { } hidden)
                return hidden;
            var plant = await session.Db.Plants.SingleAsync(p => p.Id == review.PlantId, cancellation);
            if (!plant.MayApprove(access) && access.Refuse(review.PlantId, Right.SubmitReview, What) is { } refusal)
                return refusal;
            var moved = review.Withdraw(access.AccountId, noted.Value, session.Now);
            if (!moved.Succeeded)
                return moved.Refusal;
            session.Tell(HistoryDraft.Of(review.PlantId, What, review.Id, "withdrawn",
                ("from", ReviewMoves.InWords(moved.Value.From)), ("why", noted.Value)));
            return review.State;
        }, cancellation);
    }
}
