namespace PathPortal.Portal.Domain.Runs;

/// <summary>
/// Who asked for which run: a revision on an assignment, with the setup, criteria and terms of that moment. Enough to build the scenario
/// again. The newest request of a revision and assignment is its current evidence.
/// </summary>
public sealed class RunRequest
{
    public RunRequest(
        Run? run, string? problem, Guid revisionId, Guid assignmentId, Guid cellSetupId, Guid criteriaSheetVersionId, Guid? by,
        DateTimeOffset at)
    {
        if (run is null == problem is null)
            throw new ArgumentException("A request has a run, or a problem that stands in its way.", nameof(run));
        Id = Guid.CreateVersion7(at);
        RunId = run?.Id;
        Problem = problem;
        RevisionId = revisionId;
        AssignmentId = assignmentId;
        CellSetupId = cellSetupId;
        CriteriaSheetVersionId = criteriaSheetVersionId;
        RequestedBy = by;
        RequestedAt = at;
    }

    private RunRequest()
    {
    }

    public Guid Id { get; private set; }

    public Guid? RunId { get; private set; }

    /// <summary>Why nothing can be simulated, such as a tool the setup no longer has; null when there is a run.</summary>
    public string? Problem { get; private set; }

    public Guid RevisionId { get; private set; }

    public Guid AssignmentId { get; private set; }

    public Guid CellSetupId { get; private set; }

    public Guid CriteriaSheetVersionId { get; private set; }

    /// <summary>Null when a re-check asked, not a person.</summary>
    public Guid? RequestedBy { get; private set; }

    public DateTimeOffset RequestedAt { get; private set; }
}
