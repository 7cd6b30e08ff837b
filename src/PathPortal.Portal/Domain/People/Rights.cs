using System.Collections.Frozen;

namespace PathPortal.Portal.Domain.People;

/// <summary>Which roles carry which right. The one table every handler and page goes by.</summary>
public static class Rights
{
    private static readonly FrozenDictionary<Right, Role[]> Carriers = new Dictionary<Right, Role[]>
    {
        [Right.Read] = Enum.GetValues<Role>(),
        [Right.EditPrograms] = [Role.Author, Role.CellOwner, Role.Lead],
        [Right.UploadRevision] = [Role.Author, Role.Lead],
        [Right.SubmitReview] = [Role.Author, Role.Lead],
        [Right.AttachControllerFile] = [Role.Author, Role.CellOwner, Role.Lead],
        [Right.EditArmModels] = [Role.CellOwner, Role.Lead],
        [Right.EditCells] = [Role.CellOwner],
        [Right.EditCriteria] = [Role.Lead],
        [Right.ManagePlant] = [Role.Administrator],
    }.ToFrozenDictionary();

    public static bool Carries(Role role, Right right) => Carriers[right].Contains(role);

    public static IReadOnlyList<Role> RolesFor(Right right) => Carriers[right];
}
