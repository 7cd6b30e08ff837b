using PathPortal.Portal.Domain.Runs;

namespace PathPortal.Portal.Handling.Programs;

/// <summary>A revision just kept, and the runs asked for: one request per cell.</summary>
public sealed record UploadedRevision(Guid Id, int Number, IReadOnlyList<RunRequest> Requests);
