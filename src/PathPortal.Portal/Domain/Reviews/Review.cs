namespace PathPortal.Portal.Domain.Reviews;

/// <summary>
/// The way of one revision on one assignment from draft to release. Every step is a method that moves it or says why not; the database
/// holds order and four eyes a second time.
/// </summary>
public sealed class Review
{
    private readonly List<ReviewTransition> _transitions = [];
    private readonly List<Decision> _decisions = [];

    public Review(Guid plantId, Guid revisionId, Guid assignmentId, DateTimeOffset at)
    {
        Id = Guid.CreateVersion7(at);
        PlantId = plantId;
        RevisionId = revisionId;
        AssignmentId = assignmentId;
        CreatedAt = at;
    }

    private Review()
    {
    }

    public Guid Id { get; private set; }

    /// <summary>The plant of the cell: its rule of approval holds.</summary>
    public Guid PlantId { get; private set; }

    public Guid RevisionId { get; private set; }

    public Guid AssignmentId { get; private set; }

    public DateTimeOffset CreatedAt { get; private set; }

    public ReviewState State { get; private set; } = ReviewState.Draft;

    /// <summary>Counts submissions, from 1; approvals of earlier rounds no longer count.</summary>
    public int Round { get; private set; }

    public Guid? SubmittedBy { get; private set; }

    public DateTimeOffset? SubmittedAt { get; private set; }

    /// <summary>The plant's rule when it was submitted.</summary>
    public int ApprovalsRequired { get; private set; }

    /// <summary>Approvals of this round so far.</summary>
    public int ApprovalsGiven { get; private set; }

    /// <summary>Number of the newest transition; 0 before the first.</summary>
    public int LatestTransition { get; private set; }

    public uint Version { get; private set; }

    /// <summary>Every step so far, if loaded, and those just made.</summary>
    public IReadOnlyList<ReviewTransition> Transitions => _transitions;

    /// <summary>Every decision so far, if loaded, and the one just made.</summary>
    public IReadOnlyList<Decision> Decisions => _decisions;

    public Outcome<ReviewTransition> Submit(Guid by, int approvalsRequired, string why, DateTimeOffset at)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(approvalsRequired, 1);
        var moved = Move(ReviewState.InReview, by, why, at);
        if (moved.Succeeded)
        {
            Round++;
            SubmittedBy = by;
            SubmittedAt = at;
            ApprovalsRequired = approvalsRequired;
            ApprovalsGiven = 0;
        }
        return moved;
    }

    /// <summary>Adds one approval or rejection. Needs <see cref="Decisions"/> of this round loaded.</summary>
    public Outcome<Decision> Decide(
        DecisionKind kind, Guid by, Guid uploadedBy, Evidence evidence, Guid runRequestId, string meaning, string reason, DateTimeOffset at)
    {
        if (State != ReviewState.InReview)
            return new Refusal(RefusalKind.WrongState, $"The review is {ReviewMoves.InWords(State)}, not in review; nothing can be decided.");
        if (by == uploadedBy)
            return new Refusal(RefusalKind.FourEyes, "You uploaded this revision; somebody else has to decide on it.");
        if (by == SubmittedBy)
            return new Refusal(RefusalKind.FourEyes, "You submitted this revision for review; somebody else has to decide on it.");
        if (_decisions.Any(d => d.Round == Round && d.DecidedBy == by))
            return new Refusal(RefusalKind.FourEyes, "You have decided on this revision already; the next decision is another person's.");
        if (kind == DecisionKind.Reject && string.IsNullOrWhiteSpace(reason))
            return new Refusal(RefusalKind.Invalid, "A rejection needs a reason.");

        var decision = new Decision(this, kind, by, uploadedBy, evidence, runRequestId, meaning, reason.Trim(), at);
        _decisions.Add(decision);
        if (kind == DecisionKind.Reject)
        {
            Move(ReviewState.Rejected, by, reason, at);
        }
        else
        {
            ApprovalsGiven++;
            if (ApprovalsGiven >= ApprovalsRequired)
                Move(ReviewState.Approved, by, reason, at);
        }
        return decision;
    }

    public Outcome<ReviewTransition> Withdraw(Guid by, string why, DateTimeOffset at) =>
        WithReason(ReviewState.Withdrawn, by, why, at);

    /// <summary>A newer revision takes its place on this assignment.</summary>
    public Outcome<ReviewTransition> Supersede(Guid? by, string why, DateTimeOffset at) => Move(ReviewState.Superseded, by, why, at);

    public Outcome<ReviewTransition> Prove(Guid by, string why, DateTimeOffset at) => Move(ReviewState.Proved, by, why, at);

    public Outcome<ReviewTransition> Release(Guid by, string why, DateTimeOffset at) => Move(ReviewState.Released, by, why, at);

    /// <summary>The evidence no longer holds; by a person or by a re-check.</summary>
    public Outcome<ReviewTransition> Suspend(Guid? by, string why, DateTimeOffset at) =>
        WithReason(ReviewState.Suspended, by, why, at);

    private Outcome<ReviewTransition> WithReason(ReviewState to, Guid? by, string why, DateTimeOffset at) => string.IsNullOrWhiteSpace(why)
        ? new Refusal(RefusalKind.Invalid, $"To be {ReviewMoves.InWords(to)} it needs a reason.")
        : Move(to, by, why, at);

    private Outcome<ReviewTransition> Move(ReviewState to, Guid? by, string why, DateTimeOffset at)
    {
        if (!ReviewMoves.MayFollow(State, to))
        {
            return new Refusal(
                RefusalKind.WrongState, $"The review is {ReviewMoves.InWords(State)}; it can't become {ReviewMoves.InWords(to)} from there.");
        }
        var transition = new ReviewTransition(Id, ++LatestTransition, State, to, by, why.Trim(), at);
        _transitions.Add(transition);
        State = to;
        return transition;
    }
}
