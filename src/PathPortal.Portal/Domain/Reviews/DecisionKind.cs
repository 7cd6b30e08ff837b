namespace PathPortal.Portal.Domain.Reviews;

/// <summary>What a decision says.</summary>
public enum DecisionKind
{
    Approve,
    Reject,
}
