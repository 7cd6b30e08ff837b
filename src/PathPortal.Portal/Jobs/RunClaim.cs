namespace PathPortal.Portal.Jobs;

/// <summary>A worker's hold on a run. Whatever it writes counts only while the run is still running under this attempt.</summary>
internal sealed record RunClaim(Guid RunId, int Attempt);
