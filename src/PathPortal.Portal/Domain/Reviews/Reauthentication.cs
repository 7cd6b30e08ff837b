namespace PathPortal.Portal.Domain.Reviews;

/// <summary>Proof that the person at the keyboard signed in again for one decision. Made only where a password or a fresh sign-in was checked.</summary>
/// <param name="AccountId">Who was checked.</param>
/// <param name="Method">How, for the history: "password", "identity provider".</param>
public sealed record Reauthentication(Guid AccountId, string Method, DateTimeOffset At)
{
    /// <summary>A proof is for the decision at hand, not for the afternoon.</summary>
    public static readonly TimeSpan Lifetime = TimeSpan.FromMinutes(2);

    public bool Covers(Guid accountId, DateTimeOffset now) => accountId == AccountId && At <= now && now - At <= Lifetime;
}
