using Microsoft.AspNetCore.Identity;

namespace PathPortal.Portal.Domain.People;

/// <summary>A person who signs in, by e-mail address.</summary>
public sealed class Account : IdentityUser<Guid>
{
    public Account(string email, string displayName, DateTimeOffset at)
        : base(email)
    {
        Id = Guid.CreateVersion7(at);
        Email = email;
        DisplayName = displayName;
        CreatedAt = at;
        SecurityStamp = Guid.NewGuid().ToString("N");
        LockoutEnabled = true;
    }

    private Account()
    {
    }

    /// <summary>The name shown beside everything the account does.</summary>
    public string DisplayName { get; set; } = "";

    public DateTimeOffset CreatedAt { get; private set; }

    /// <summary>Null while the account may act.</summary>
    public DateTimeOffset? DisabledAt { get; private set; }

    /// <summary>May found plants, make accounts and give any role. Says nothing about approving.</summary>
    public bool AdministersCompany { get; set; }

    public void Disable(DateTimeOffset at)
    {
        DisabledAt ??= at;
        // Ends sessions that are still open elsewhere.
        SecurityStamp = Guid.NewGuid().ToString("N");
    }

    public void Enable() => DisabledAt = null;
}
