using PathPortal.Engine.Verdicts;

namespace PathPortal.Engine;

/// <summary>What one simulation gives back.</summary>
/// <param name="Summary">Verdict, outcomes, findings.</param>
/// <param name="Bins">Limit use along the run; null when the run has no samples (it could not start).</param>
/// <param name="Samples">Every sample; null when not asked for or when there are none.</param>
public sealed record RunResult(RunSummary Summary, UseBins? Bins, RunSamples? Samples);
