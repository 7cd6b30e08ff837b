namespace PathPortal.Portal.Data.Queries;

/// <summary>An arm version to choose for a setup.</summary>
public sealed record ArmChoice(Guid VersionId, string Arm, int Number, bool Newest);
