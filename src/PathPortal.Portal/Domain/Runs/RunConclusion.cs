using PathPortal.Engine.Verdicts;

namespace PathPortal.Portal.Domain.Runs;

/// <summary>What a worker found, in the form it is stored.</summary>
public sealed record RunConclusion(
    Verdict Verdict, double? WorstUse, Criterion? WorstCriterion, double CycleTime, string SummaryJson, byte[]? Bins);
