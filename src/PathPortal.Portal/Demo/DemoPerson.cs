using PathPortal.Portal.Domain.People;

namespace PathPortal.Portal.Demo;

/// <summary>One invented person and what they are in the invented plants.</summary>
/// <param name="About">What to try with this account, for the passwords file.</param>
public sealed record DemoPerson(string Email, string Name, bool AdministersCompany, string About, params (string Plant, Role[] Roles)[] Roles);
