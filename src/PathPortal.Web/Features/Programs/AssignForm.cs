namespace PathPortal.Web.Features.Programs;

public sealed class AssignForm
{
    public string? Tool { get; set; }

    public string? Frame { get; set; }

    public string? Start { get; set; }

    public string? Turn { get; set; }
}
