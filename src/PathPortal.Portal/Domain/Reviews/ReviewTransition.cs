namespace PathPortal.Portal.Domain.Reviews;

/// <summary>One step of a review: who moved it, when and why.</summary>
public sealed class ReviewTransition
{
    internal ReviewTransition(Guid reviewId, int number, ReviewState from, ReviewState to, Guid? by, string why, DateTimeOffset at)
    {
        ReviewId = reviewId;
        Number = number;
        From = from;
        To = to;
        By = by;
        Why = why;
        At = at;
    }

    private ReviewTransition()
    {
    }

    public Guid ReviewId { get; private set; }

    /// <summary>From 1, without gaps.</summary>
    public int Number { get; private set; }

    public ReviewState From { get; private set; }

    public ReviewState To { get; private set; }

    /// <summary>Null when a re-check moved it, not a person.</summary>
    public Guid? By { get; private set; }

    public string Why { get; private set; } = "";

    public DateTimeOffset At { get; private set; }
}
