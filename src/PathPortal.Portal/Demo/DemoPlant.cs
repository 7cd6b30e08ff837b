using PathPortal.Portal.Domain.People;

namespace PathPortal.Portal.Demo;

/// <summary>One invented plant and its rule of approval.</summary>
public sealed record DemoPlant(string Name, string TimeZone, int ApprovalsRequired, params Role[] ApprovingRoles);
