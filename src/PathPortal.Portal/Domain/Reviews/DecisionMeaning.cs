namespace PathPortal.Portal.Domain.Reviews;

/// <summary>What a decision means, in the words the decider reads before signing. Stored with the decision, so a change of words changes no old one.</summary>
public static class DecisionMeaning
{
    public static string Of(DecisionKind kind) => kind switch
    {
        DecisionKind.Approve =>
            "I have looked at this run and at what it does not check. By the stated criteria this revision may be proved on this cell at reduced "
            + "speed. My approval holds for exactly this revision, setup, criteria, run and controller file.",
        DecisionKind.Reject => "I have looked at this run. This revision must not go to this cell as it is, for the reason I give.",
        _ => throw new ArgumentOutOfRangeException(nameof(kind), kind, "No such decision."),
    };
}
