using PathPortal.Portal.Domain.People;

namespace PathPortal.Portal.Data.Queries;

/// <summary>What the portal is set up with, as far as the reader's plants go, and what the reader may add.</summary>
/// <param name="People">Empty for readers who administer nothing.</param>
public sealed record SetupOverview(
    bool AdministersCompany, bool MayEditShared, IReadOnlyList<SetupOverview.Plant> Plants, IReadOnlyList<SetupOverview.Person> People,
    IReadOnlyList<SetupOverview.Part> Parts, IReadOnlyList<SetupOverview.Sheet> Sheets, SetupOverview.Counts Count)
{
    public sealed record Plant(
        Guid Id, string Name, string TimeZone, int ApprovalsRequired, IReadOnlyList<Role> ApprovingRoles, int Cells, bool MayManage, bool MayEditPrograms);

    public sealed record Person(
        Guid Id, string Name, string Email, bool AdministersCompany, DateTimeOffset? DisabledAt, IReadOnlyList<GivenRole> Roles);

    public sealed record GivenRole(Guid PlantId, Role Role);

    public sealed record Part(Guid Id, string Name, string Note, int Programs);

    public sealed record Sheet(Guid Id, string Name);

    public sealed record Counts(int ArmModels, int Cells, int CellsWithSetup, int Sheets, int Programs, int Assignments, int Revisions);
}
