using PathPortal.Engine;

namespace PathPortal.Portal.Simulation;

/// <summary>A finished run in full again: what went in and every sample that came out. Shared between readers; nobody writes to it.</summary>
public sealed record RecomputedRun(Guid RunId, string Digest, Scenario Scenario, RunSamples Samples);
