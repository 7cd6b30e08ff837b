namespace PathPortal.Portal.Domain.People;

/// <summary>One role of one account in one plant.</summary>
public sealed class PlantRole
{
    public PlantRole(Guid accountId, Guid plantId, Role role, DateTimeOffset at)
    {
        AccountId = accountId;
        PlantId = plantId;
        Role = role;
        GivenAt = at;
    }

    private PlantRole()
    {
    }

    public Guid AccountId { get; private set; }

    public Guid PlantId { get; private set; }

    public Role Role { get; private set; }

    public DateTimeOffset GivenAt { get; private set; }
}
