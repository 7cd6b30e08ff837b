namespace PathPortal.Portal.Domain.Reviews;

/// <summary>
/// The digests a decision binds to. A decider is shown them and sends them back; if any differs by then, what was looked at is no longer
/// what would be approved.
/// </summary>
public sealed record Evidence(
    string RevisionSha256, string SetupSha256, string CriteriaSha256, string RunDigest, string? ControllerFileSha256)
{
    /// <summary>In words, what differs from <paramref name="shown"/>; null when nothing does.</summary>
    public string? ChangedSince(Evidence shown)
    {
        var changed = new List<string>();
        if (RevisionSha256 != shown.RevisionSha256)
            changed.Add("the revision");
        if (SetupSha256 != shown.SetupSha256)
            changed.Add("the cell's setup");
        if (CriteriaSha256 != shown.CriteriaSha256)
            changed.Add("the criteria");
        if (RunDigest != shown.RunDigest)
            changed.Add("the run");
        if (ControllerFileSha256 != shown.ControllerFileSha256)
            changed.Add("the controller file");
        return changed.Count == 0 ? null : string.Join(", ", changed);
    }
}
