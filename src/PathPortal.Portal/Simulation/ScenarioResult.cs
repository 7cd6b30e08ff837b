using System.Collections.Immutable;
using System.Diagnostics.CodeAnalysis;
using PathPortal.Engine;

namespace PathPortal.Portal.Simulation;

/// <summary>A scenario with its digest, or the problems that prevent one.</summary>
public sealed record ScenarioResult
{
    internal ScenarioResult(Scenario scenario, string digest)
    {
        Scenario = scenario;
        Digest = digest;
    }

    internal ScenarioResult(ImmutableArray<ScenarioProblem> problems) => Problems = problems;

    public Scenario? Scenario { get; }

    /// <summary>SHA-256 of everything the numbers depend on, hexadecimal, as a run is stored under.</summary>
    public string? Digest { get; }

    /// <summary>Empty exactly when there is a scenario.</summary>
    public ImmutableArray<ScenarioProblem> Problems { get; } = [];

    [MemberNotNullWhen(true, nameof(Scenario), nameof(Digest))]
    public bool Ok => Scenario is not null;

    /// <summary>All problems as one text; empty when there are none.</summary>
    public string ProblemText => string.Join(' ', Problems.Select(p => p.Message));
}
