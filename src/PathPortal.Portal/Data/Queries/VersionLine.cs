namespace PathPortal.Portal.Data.Queries;

/// <summary>One version of a definition in a list, newest first.</summary>
public sealed record VersionLine(Guid Id, int Number, string Sha256, string Note, string By, DateTimeOffset At);
