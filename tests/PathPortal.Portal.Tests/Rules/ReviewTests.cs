using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.Reviews;

namespace PathPortal.Portal.Tests.Rules;

public sealed class ReviewTests
{
    private static readonly Guid Uploader = Guid.NewGuid();
    private static readonly Guid Submitter = Guid.NewGuid();
    private static readonly Guid First = Guid.NewGuid();
    private static readonly Guid Second = Guid.NewGuid();
    private static readonly DateTimeOffset At = new(2026, 3, 1, 8, 0, 0, TimeSpan.Zero);
    private static readonly Evidence Shown = new("a", "b", "c", "d", null);

    // The workflow as it was agreed, written down a second time on purpose.
    public static TheoryData<ReviewState, string> Moves()
    {
        var data = new TheoryData<ReviewState, string>();
        foreach (var (from, to) in new Dictionary<ReviewState, string>
        {
            [ReviewState.Draft] = "submit withdraw supersede",
            [ReviewState.InReview] = "withdraw supersede decide",
            [ReviewState.Approved] = "withdraw supersede suspend prove",
            [ReviewState.Proved] = "withdraw supersede suspend release",
            [ReviewState.Released] = "withdraw supersede suspend",
            [ReviewState.Rejected] = "submit supersede",
            [ReviewState.Withdrawn] = "submit",
            [ReviewState.Superseded] = "",
            [ReviewState.Suspended] = "submit withdraw supersede",
        })
            data.Add(from, to);
        return data;
    }

    [Theory]
    [MemberData(nameof(Moves))]
    public void EveryStep_FromEveryState_MovesOrSaysWhyNot(ReviewState from, string allowed)
    {
        var steps = new Dictionary<string, Func<Review, Refusal?>>
        {
            ["submit"] = r => r.Submit(Submitter, 1, "", At).Refusal,
            ["withdraw"] = r => r.Withdraw(Submitter, "because", At).Refusal,
            ["supersede"] = r => r.Supersede(null, "newer", At).Refusal,
            ["suspend"] = r => r.Suspend(null, "fails now", At).Refusal,
            ["prove"] = r => r.Prove(First, "", At).Refusal,
            ["release"] = r => r.Release(First, "", At).Refusal,
            ["decide"] = r => r.Decide(DecisionKind.Approve, First, Uploader, Shown, Guid.NewGuid(), "meaning", "", At).Refusal,
        };
        foreach (var (name, step) in steps)
        {
            var review = InState(from);
            var transitions = review.LatestTransition;

            var refusal = step(review);

            if (allowed.Split(' ').Contains(name))
            {
                Assert.Null(refusal);
                Assert.NotEqual(from, review.State);
                Assert.Equal(transitions + 1, review.LatestTransition);
            }
            else
            {
                Assert.Equal(RefusalKind.WrongState, refusal?.Kind);
                Assert.Equal(from, review.State);
                Assert.Equal(transitions, review.LatestTransition);
            }
        }
    }

    [Fact]
    public void Decide_ByUploaderOrSubmitter_IsRefused()
    {
        foreach (var by in new[] { Uploader, Submitter })
        {
            foreach (var kind in Enum.GetValues<DecisionKind>())
            {
                var review = InState(ReviewState.InReview);
                Assert.Equal(RefusalKind.FourEyes, Decide(review, by, kind).Refusal?.Kind);
                Assert.Empty(review.Decisions);
            }
        }
    }

    [Fact]
    public void Decide_TwoApprovalsRequired_NeedsTwoPeople()
    {
        var review = New();
        review.Submit(Submitter, 2, "", At);

        Assert.True(Decide(review, First).Succeeded);
        Assert.Equal(ReviewState.InReview, review.State);
        Assert.Equal(RefusalKind.FourEyes, Decide(review, First).Refusal?.Kind);
        Assert.True(Decide(review, Second).Succeeded);
        Assert.Equal(ReviewState.Approved, review.State);
    }

    [Fact]
    public void Decide_OneRejection_RejectsWhateverWasApproved()
    {
        var review = New();
        review.Submit(Submitter, 2, "", At);
        Decide(review, First);

        Assert.True(Decide(review, Second, DecisionKind.Reject).Succeeded);

        Assert.Equal(ReviewState.Rejected, review.State);
    }

    [Fact]
    public void Decide_RejectionWithoutReason_IsRefused()
    {
        var review = InState(ReviewState.InReview);
        var outcome = review.Decide(DecisionKind.Reject, First, Uploader, Shown, Guid.NewGuid(), "meaning", "  ", At);
        Assert.Equal(RefusalKind.Invalid, outcome.Refusal?.Kind);
    }

    [Fact]
    public void Submit_Again_ForgetsApprovalsOfTheRoundBefore()
    {
        var review = New();
        review.Submit(Submitter, 2, "", At);
        Decide(review, First);
        review.Withdraw(Submitter, "a slip", At);

        review.Submit(Submitter, 2, "", At);

        Assert.Equal(0, review.ApprovalsGiven);
        Assert.True(Decide(review, First).Succeeded);
        Assert.Equal(ReviewState.InReview, review.State);
    }

    [Fact]
    public void Reauthentication_Covers_OnlyItsAccountAndOnlyForAWhile()
    {
        var proof = new Reauthentication(First, "password", At);

        Assert.True(proof.Covers(First, At + Reauthentication.Lifetime));
        Assert.False(proof.Covers(First, At + Reauthentication.Lifetime + TimeSpan.FromTicks(1)));
        Assert.False(proof.Covers(First, At - TimeSpan.FromTicks(1)));
        Assert.False(proof.Covers(Second, At));
    }

    private static Review New() => new(Guid.NewGuid(), Guid.NewGuid(), Guid.NewGuid(), At);

    private static Outcome<Decision> Decide(Review review, Guid by, DecisionKind kind = DecisionKind.Approve) =>
        review.Decide(kind, by, Uploader, Shown, Guid.NewGuid(), "meaning", "reason", At);

    private static Review InState(ReviewState state)
    {
        var review = New();
        if (state == ReviewState.Draft)
            return review;
        review.Submit(Submitter, 1, "", At);
        if (state is ReviewState.Approved or ReviewState.Proved or ReviewState.Released or ReviewState.Suspended)
            Decide(review, First);
        if (state is ReviewState.Proved or ReviewState.Released)
            review.Prove(First, "", At);
        _ = state switch
        {
            ReviewState.Released => review.Release(First, "", At),
            ReviewState.Withdrawn => review.Withdraw(Submitter, "because", At),
            ReviewState.Superseded => review.Supersede(null, "newer", At),
            ReviewState.Suspended => review.Suspend(null, "fails now", At),
            _ => null,
        };
        if (state == ReviewState.Rejected)
            Decide(review, First, DecisionKind.Reject);
        Assert.Equal(state, review.State);
        return review;
    }
}
