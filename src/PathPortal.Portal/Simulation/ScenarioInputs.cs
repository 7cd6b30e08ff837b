using PathPortal.Portal.Domain.Programs;

namespace PathPortal.Portal.Simulation;

/// <summary>The stored versions a scenario is built from, apart from the path. Each text is a canonical document.</summary>
/// <param name="ArmJson">The arm model version the setup names.</param>
/// <param name="Terms">Tool, work frame and start of the assignment.</param>
public sealed record ScenarioInputs(string ArmJson, string SetupJson, string CriteriaJson, StartTerms Terms);
