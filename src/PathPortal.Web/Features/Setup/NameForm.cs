namespace PathPortal.Web.Features.Setup;

public sealed class NameForm
{
    public string? Name { get; set; }

    public string? Zone { get; set; }

    public string? Note { get; set; }
}
