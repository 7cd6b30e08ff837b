namespace PathPortal.Portal.Domain.People;

/// <summary>What one account may do, as read inside the transaction that acts on it.</summary>
public sealed class Access
{
    private readonly HashSet<(Guid Plant, Role Role)> _roles;

    public Access(Guid accountId, string displayName, bool enabled, bool administersCompany, IEnumerable<(Guid Plant, Role Role)> roles)
    {
        AccountId = accountId;
        DisplayName = displayName;
        Enabled = enabled;
        AdministersCompany = enabled && administersCompany;
        _roles = enabled ? [.. roles] : [];
    }

    public Guid AccountId { get; }

    public string DisplayName { get; }

    public bool Enabled { get; }

    public bool AdministersCompany { get; }

    /// <summary>Plants in which the account has any role.</summary>
    public IReadOnlyCollection<Guid> Plants => [.. _roles.Select(r => r.Plant).Distinct()];

    public bool Has(Guid plantId, Role role) => _roles.Contains((plantId, role));

    public IReadOnlyList<Role> RolesIn(Guid plantId) => [.. _roles.Where(r => r.Plant == plantId).Select(r => r.Role).Order()];

    public bool May(Guid plantId, Right right) =>
        _roles.Any(r => r.Plant == plantId && Rights.Carries(r.Role, right))
        || (AdministersCompany && right is (Right.ManagePlant or Right.Read));

    public bool MaySomewhere(Right right) => _roles.Any(r => Rights.Carries(r.Role, right)) || (AdministersCompany && right == Right.Read);

    /// <summary>
    /// Null when the account may; else why not. To somebody who cannot even read the plant its things do not exist, so ids tell nothing.
    /// </summary>
    public Refusal? Refuse(Guid plantId, Right right, string what)
    {
        if (!Enabled)
            return new(RefusalKind.NotAllowed, "This account is disabled.");
        if (!May(plantId, Right.Read))
            return Refusal.NotFound(what);
        return May(plantId, right)
            ? null
            : new(RefusalKind.NotAllowed, $"This needs one of the roles {string.Join(", ", Rights.RolesFor(right))} in the plant.");
    }

    /// <summary>The same for what the whole company shares: the right in any plant will do.</summary>
    public Refusal? RefuseShared(Right right)
    {
        if (!Enabled)
            return new(RefusalKind.NotAllowed, "This account is disabled.");
        return MaySomewhere(right)
            ? null
            : new(RefusalKind.NotAllowed, $"This needs one of the roles {string.Join(", ", Rights.RolesFor(right))} in a plant.");
    }
}
