namespace PathPortal.Web.Features.Setup;

public sealed class AccountForm
{
    public string? Name { get; set; }

    public string? Email { get; set; }

    public string? Password { get; set; }

    public bool AdministersCompany { get; set; }
}
