namespace PathPortal.Portal.Domain.Reviews;

/// <summary>Where a revision stands on one cell. Stored by name.</summary>
public enum ReviewState
{
    Draft,
    InReview,
    Approved,

    /// <summary>Proved on the floor.</summary>
    Proved,
    Released,
    Rejected,
    Withdrawn,
    Superseded,

    /// <summary>Approved once, but the evidence no longer holds.</summary>
    Suspended,
}
