namespace PathPortal.Portal.Data.Queries;

/// <summary>What waits for one account.</summary>
/// <param name="ToDecide">In review, and this account may decide.</param>
/// <param name="SentBack">Submitted by this account and rejected, no newer revision yet.</param>
/// <param name="InReview">Submitted by this account, waiting for others.</param>
public sealed record WaitingLists(IReadOnlyList<Waiting> ToDecide, IReadOnlyList<Waiting> SentBack, IReadOnlyList<Waiting> InReview);
