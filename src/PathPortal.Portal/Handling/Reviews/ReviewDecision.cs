using PathPortal.Portal.Domain.Reviews;

namespace PathPortal.Portal.Handling.Reviews;

/// <summary>What somebody decided on a review, and the digests they were shown when they did.</summary>
public sealed record ReviewDecision(Guid ReviewId, DecisionKind Kind, Evidence Shown, string Reason);
