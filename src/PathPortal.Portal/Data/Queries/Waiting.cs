using PathPortal.Portal.Domain.Reviews;

namespace PathPortal.Portal.Data.Queries;

/// <summary>One review somebody has to look at.</summary>
/// <param name="By">Who submitted it, or who rejected it.</param>
public sealed record Waiting(
    Guid ReviewId, ReviewState State, string Program, int RevisionNumber, string Cell, string Plant, string PlantTimeZone, string? By, DateTimeOffset? Since);
