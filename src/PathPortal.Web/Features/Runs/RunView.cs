using PathPortal.Engine;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Verdicts;

namespace PathPortal.Web.Features.Runs;

/// <summary>A finished run as its page shows it, from the stored row alone: no sample is needed.</summary>
public sealed record RunView
{
    public required Guid Id { get; init; }

    /// <summary>The verdict in one line, with place and reason.</summary>
    public required string Sentence { get; init; }

    public required RunSummary Summary { get; init; }

    /// <summary>Null when the run could not start.</summary>
    public required UseBins? Bins { get; init; }

    public required ArmModel Arm { get; init; }

    public required CriteriaSheet Criteria { get; init; }

    public required RunInputs Inputs { get; init; }

    /// <summary>The run that took this one's place as evidence for the revision on the cell; null when this is the current one.</summary>
    public Guid? Newer { get; init; }

    /// <summary>The cursor starts here: at the worst place.</summary>
    public Place? Worst =>
        Summary.Outcomes.Where(o => o.Place is not null)
            .OrderByDescending(o => o.Binding).ThenByDescending(o => o.WorstUse ?? 0)
            .Select(o => o.Place).FirstOrDefault();

    public string Href => $"/runs/{Id}";

    public string HrefAt(Place place) => FormattableString.Invariant($"{Href}#t={place.Time:0.####}");

    public string JointName(int joint) => joint < Arm.Joints.Length ? Arm.Joints[joint].Name : FormattableString.Invariant($"joint {joint + 1}");

    public CriterionOutcome? Outcome(Criterion criterion) => Summary.Outcomes.FirstOrDefault(o => o.Criterion == criterion);
}
