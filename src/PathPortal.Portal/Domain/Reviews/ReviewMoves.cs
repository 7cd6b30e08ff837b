using System.Collections.Frozen;

namespace PathPortal.Portal.Domain.Reviews;

/// <summary>Which state follows which. The database holds the same table in a trigger; a test compares the two.</summary>
public static class ReviewMoves
{
    private static readonly FrozenSet<(ReviewState From, ReviewState To)> Allowed = new (ReviewState, ReviewState)[]
    {
        (ReviewState.Draft, ReviewState.InReview),
        (ReviewState.Draft, ReviewState.Withdrawn),
        (ReviewState.Draft, ReviewState.Superseded),
        (ReviewState.InReview, ReviewState.Approved),
        (ReviewState.InReview, ReviewState.Rejected),
        (ReviewState.InReview, ReviewState.Withdrawn),
        (ReviewState.InReview, ReviewState.Superseded),
        (ReviewState.Approved, ReviewState.Proved),
        (ReviewState.Approved, ReviewState.Withdrawn),
        (ReviewState.Approved, ReviewState.Superseded),
        (ReviewState.Approved, ReviewState.Suspended),
        (ReviewState.Proved, ReviewState.Released),
        (ReviewState.Proved, ReviewState.Withdrawn),
        (ReviewState.Proved, ReviewState.Superseded),
        (ReviewState.Proved, ReviewState.Suspended),
        (ReviewState.Released, ReviewState.Withdrawn),
        (ReviewState.Released, ReviewState.Superseded),
        (ReviewState.Released, ReviewState.Suspended),
        // The same revision may pass after all when the cell or the criteria changed; it starts over.
        (ReviewState.Rejected, ReviewState.InReview),
        (ReviewState.Rejected, ReviewState.Superseded),
        (ReviewState.Withdrawn, ReviewState.InReview),
        (ReviewState.Suspended, ReviewState.InReview),
        (ReviewState.Suspended, ReviewState.Withdrawn),
        (ReviewState.Suspended, ReviewState.Superseded),
    }.ToFrozenSet();

    public static IReadOnlyCollection<(ReviewState From, ReviewState To)> All => Allowed;

    public static bool MayFollow(ReviewState from, ReviewState to) => Allowed.Contains((from, to));

    /// <summary>The state in words, as pages show it.</summary>
    public static string InWords(ReviewState state) => state switch
    {
        ReviewState.InReview => "in review",
        ReviewState.Proved => "proved on the floor",
        _ => state.ToString().ToLowerInvariant(),
    };
}
