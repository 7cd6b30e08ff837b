using PathPortal.Engine;

namespace PathPortal.Web.Features.Runs.Samples;

/// <summary>A run in full: what went in and every sample that came out.</summary>
public sealed record RunMaterial(Scenario Scenario, RunSamples Samples);
