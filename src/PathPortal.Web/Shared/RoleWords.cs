using PathPortal.Portal.Domain.People;

namespace PathPortal.Web.Shared;

public static class RoleWords
{
    public static string Name(Role role) => role switch
    {
        Role.CellOwner => "cell owner",
        Role.Lead => "lead engineer",
        Role.Administrator => "plant administrator",
        _ => role.ToString().ToLowerInvariant(),
    };

    public static string Does(Role role) => role switch
    {
        Role.Viewer => "reads everything of the plant",
        Role.Author => "uploads revisions and submits them for review",
        Role.CellOwner => "keeps arms, cells and assignments true; may approve where the plant says so",
        Role.Lead => "sets criteria, uploads, may approve where the plant says so",
        Role.Administrator => "gives roles in the plant",
        _ => "",
    };
}
