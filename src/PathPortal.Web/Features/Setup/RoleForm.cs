using PathPortal.Portal.Domain.People;

namespace PathPortal.Web.Features.Setup;

public sealed class RoleForm
{
    public Guid AccountId { get; set; }

    public Guid PlantId { get; set; }

    public Role Role { get; set; } = Role.Author;

    public bool Given { get; set; }
}
