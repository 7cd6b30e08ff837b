using PathPortal.Portal.Domain.Reviews;

namespace PathPortal.Web.Features.Reviews;

/// <summary>A decision as posted, with the digests the page showed.</summary>
public sealed class DecideForm
{
    public string? Kind { get; set; }

    public string? Reason { get; set; }

    public string? Password { get; set; }

    public string? RevisionSha256 { get; set; }

    public string? SetupSha256 { get; set; }

    public string? CriteriaSha256 { get; set; }

    public string? RunDigest { get; set; }

    public string? ControllerFileSha256 { get; set; }

    public Evidence Shown => new(
        RevisionSha256 ?? "", SetupSha256 ?? "", CriteriaSha256 ?? "", RunDigest ?? "", string.IsNullOrEmpty(ControllerFileSha256) ? null : ControllerFileSha256);
}
