namespace PathPortal.Web.Hosting;

/// <summary>Claims the cookie carries beside those of the identity system.</summary>
public static class AccountClaims
{
    public const string DisplayName = "pathportal:display_name";
}
