using Microsoft.AspNetCore.Identity;
using Microsoft.Extensions.DependencyInjection;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.Fleet;
using PathPortal.Portal.Domain.People;

namespace PathPortal.Web.Tests.Support;

/// <summary>Makes plants and accounts directly in the database.</summary>
public sealed class People(IServiceProvider services)
{
    public const string Password = "grey pencil over nine hills";

    private static readonly DateTimeOffset At = new(2026, 1, 5, 8, 0, 0, TimeSpan.Zero);

    private PortalDb Db => services.GetRequiredService<PortalDb>();

    public async Task<Plant> PlantAsync(string name = "Harbour works", int approvals = 1)
    {
        var plant = new Plant(name, "Europe/Berlin", approvals, [Role.CellOwner, Role.Lead], At);
        await SaveAsync(plant);
        return plant;
    }

    public async Task<Account> AccountAsync(string email, string name, params (Plant Plant, Role Role)[] roles) => await AccountAsync(email, name, false, roles);

    public async Task<Account> AccountAsync(string email, string name, bool administersCompany, params (Plant Plant, Role Role)[] roles)
    {
        var account = new Account(email, name, At) { AdministersCompany = administersCompany };
        await using (var scope = services.CreateAsyncScope())
        {
            var made = await scope.ServiceProvider.GetRequiredService<UserManager<Account>>().CreateAsync(account, Password);
            Assert.True(made.Succeeded, string.Join(' ', made.Errors.Select(e => e.Description)));
        }
        await SaveAsync([.. roles.Select(r => new PlantRole(account.Id, r.Plant.Id, r.Role, At))]);
        return account;
    }

    public async Task SaveAsync(params object[] things)
    {
        await using var session = await Db.OpenAsync(Actor.Process("test"));
        session.Db.AddRange(things);
        await session.CommitAsync();
    }

    public async Task ChangeAsync(Func<PortalSession, Task> change)
    {
        await using var session = await Db.OpenAsync(Actor.Process("test"));
        await change(session);
        await session.CommitAsync();
    }
}
