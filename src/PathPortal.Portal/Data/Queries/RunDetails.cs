using PathPortal.Portal.Domain.Runs;

namespace PathPortal.Portal.Data.Queries;

/// <summary>One run with everything it was asked for, as stored. Documents are canonical JSON.</summary>
/// <param name="Review">The review that stands on this revision and assignment, when there is one.</param>
public sealed record RunDetails(
    Run Run, RunDetails.Place At, RunDetails.Named Program, RunDetails.Version Revision, string RevisionFile, RunDetails.Named Cell,
    RunDetails.Version Setup, RunDetails.Named Arm, RunDetails.Version ArmVersion, RunDetails.Named Criteria, RunDetails.Version CriteriaVersion,
    string ToolName, string WorkFrameName, string ArmJson, string CriteriaJson, Guid? Review, Guid? NewerRunId, DateTimeOffset? WorkerLastSeen)
{
    public sealed record Place(Guid PlantId, string Plant, string TimeZone);

    public sealed record Named(Guid Id, string Name);

    public sealed record Version(Guid Id, int Number, string Sha256);
}
