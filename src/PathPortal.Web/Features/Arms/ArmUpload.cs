namespace PathPortal.Web.Features.Arms;

/// <summary>What the import form sends.</summary>
public sealed class ArmUpload
{
    public IFormFile? File { get; set; }

    public string? BaseLink { get; set; }

    public string? TipLink { get; set; }

    public string? Note { get; set; }
}
