using System.Globalization;
using Microsoft.AspNetCore.Identity;
using Microsoft.EntityFrameworkCore;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.Fleet;
using PathPortal.Portal.Domain.History;
using PathPortal.Portal.Domain.People;
using PathPortal.Portal.Handling.People;

namespace PathPortal.Portal.Demo;

/// <summary>Brings the invented company into a database. What is there already stays; a second load changes nothing.</summary>
public sealed class DemoLoader(PortalDb db, IPasswordHasher<Account> hasher, DemoDefinitions definitions, DemoUploads uploads)
{
    private static readonly Actor Actor = Actor.Process("load-demo");

    /// <summary>Loads and says what was done, in sentences for a terminal.</summary>
    public async Task<IReadOnlyList<string>> LoadAsync(string passwordsFile, CancellationToken cancellation = default)
    {
        var passwords = DemoPasswords.Read(passwordsFile);
        // An account whose password the file does not know is of no use to anybody; it gets another.
        var unknown = DemoCompany.People.Where(p => passwords.Find(p.Email) is null).ToList();
        foreach (var person in unknown)
            passwords.Create(person.Email);
        if (unknown.Count > 0)
            passwords.Save(DemoCompany.People);

        var made = await LoadCompanyAsync(passwords, [.. unknown.Select(p => p.Email)], cancellation);
        if (!made.Succeeded)
            throw new InvalidOperationException(made.Refusal.Message);
        var places = await db.ReadAsync(Actor, session => DemoPlaces.ReadAsync(session, cancellation), cancellation);
        var cells = await definitions.LoadAsync(places, cancellation);
        var revisions = await uploads.LoadAsync(places, cancellation);
        return
        [
            made.Value == 0
                ? "The demo accounts were there already."
                : string.Create(CultureInfo.InvariantCulture, $"Demo accounts made: {made.Value}. Their passwords are in {passwordsFile}."),
            string.Create(CultureInfo.InvariantCulture, $"Demo cells made: {cells}; revisions uploaded: {revisions}."),
        ];
    }

    private Task<Outcome<int>> LoadCompanyAsync(DemoPasswords passwords, HashSet<string> renewed, CancellationToken cancellation) =>
        db.ActAsync<int>(Actor, async session =>
        {
            var plants = await session.Db.Plants.ToDictionaryAsync(p => p.Name, cancellation);
            foreach (var plant in DemoCompany.Plants.Where(p => !plants.ContainsKey(p.Name)))
            {
                var added = new Plant(plant.Name, plant.TimeZone, plant.ApprovalsRequired, plant.ApprovingRoles, session.Now);
                plants.Add(plant.Name, added);
                session.Db.Plants.Add(added);
            }
            var accounts = await session.Db.Users.ToDictionaryAsync(a => a.Email!, cancellation);
            var made = 0;
            foreach (var person in DemoCompany.People)
            {
                if (accounts.TryGetValue(person.Email, out var account))
                {
                    if (renewed.Contains(person.Email))
                        SetPassword(account, passwords.Find(person.Email)!);
                    continue;
                }
                Add(session, person, passwords.Find(person.Email)!, plants);
                made++;
            }
            if (made > 0 || renewed.Count > 0)
            {
                session.Tell(HistoryDraft.Of(null, "demo", Guid.Empty, "loaded",
                    ("accounts made", made.ToString(CultureInfo.InvariantCulture)),
                    ("passwords renewed", (renewed.Count - made).ToString(CultureInfo.InvariantCulture))));
            }
            return made;
        }, cancellation);

    private void Add(PortalSession session, DemoPerson person, string password, Dictionary<string, Plant> plants)
    {
        var normalized = EmailAddress.Normalize(person.Email);
        var account = new Account(person.Email, person.Name, session.Now)
        {
            NormalizedUserName = normalized,
            NormalizedEmail = normalized,
            EmailConfirmed = true,
            AdministersCompany = person.AdministersCompany,
        };
        SetPassword(account, password);
        session.Db.Users.Add(account);
        foreach (var (plant, roles) in person.Roles)
            session.Db.PlantRoles.AddRange(roles.Select(role => new PlantRole(account.Id, plants[plant].Id, role, session.Now)));
    }

    private void SetPassword(Account account, string password)
    {
        account.PasswordHash = hasher.HashPassword(account, password);
        account.SecurityStamp = Guid.NewGuid().ToString("N");
    }
}
