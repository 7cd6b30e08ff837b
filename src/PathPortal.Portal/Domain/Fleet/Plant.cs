using PathPortal.Portal.Domain.People;

namespace PathPortal.Portal.Domain.Fleet;

/// <summary>A site with cells, its own people and its own rule of approval.</summary>
public sealed class Plant
{
    public const int MaxApprovals = 5;

    public Plant(string name, string timeZone, int approvalsRequired, IEnumerable<Role> approvingRoles, DateTimeOffset at)
    {
        Id = Guid.CreateVersion7(at);
        Name = name;
        TimeZone = timeZone;
        CreatedAt = at;
        SetApprovalRule(approvalsRequired, approvingRoles);
    }

    private Plant()
    {
    }

    public Guid Id { get; private set; }

    public string Name { get; private set; } = "";

    /// <summary>IANA name; times are stored in UTC and shown in this zone.</summary>
    public string TimeZone { get; private set; } = "Etc/UTC";

    /// <summary>How many different accounts must approve a revision on a cell.</summary>
    public int ApprovalsRequired { get; private set; }

    /// <summary>Accounts with any of these roles in this plant may approve or reject.</summary>
    public IReadOnlyList<Role> ApprovingRoles { get; private set; } = [];

    public DateTimeOffset CreatedAt { get; private set; }

    public uint Version { get; private set; }

    public void SetApprovalRule(int approvalsRequired, IEnumerable<Role> approvingRoles)
    {
        Role[] roles = [.. approvingRoles.Distinct().Order()];
        ArgumentOutOfRangeException.ThrowIfLessThan(approvalsRequired, 1);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(approvalsRequired, MaxApprovals);
        if (roles.Length == 0)
            throw new ArgumentException("At least one role must approve.", nameof(approvingRoles));
        ApprovalsRequired = approvalsRequired;
        ApprovingRoles = roles;
    }

    public bool MayApprove(Access access) => ApprovingRoles.Any(role => access.Has(Id, role));
}
