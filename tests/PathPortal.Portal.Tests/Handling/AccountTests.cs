using Microsoft.EntityFrameworkCore;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Handling.People;
using PathPortal.Portal.Tests.Support;

namespace PathPortal.Portal.Tests.Handling;

public sealed class AccountTests
{
    [Theory]
    [InlineData("short")]
    [InlineData("aaaaaaaaaaaaaaaa")]
    [InlineData("abcdefghijklmnop")]
    [InlineData("pathportal12")]
    [InlineData("somebody@plant.example")]
    public async Task CreateAccount_WeakPassword_IsRefused(string password)
    {
        await using var scene = await PlantScene.CreateAsync();
        var outcome = await scene.Get<CreateAccount>().HandleAsync(Actor.Process("test"), "somebody@plant.example", "Somebody", password, false);
        Assert.Equal(RefusalKind.Invalid, outcome.Refusal?.Kind);
    }

    [Theory]
    [InlineData("")]
    [InlineData("nobody")]
    [InlineData("a b@plant.example")]
    [InlineData("Somebody <somebody@plant.example>")]
    [InlineData("some\u202Ebody@plant.example")]
    public async Task CreateAccount_NoAddress_IsRefused(string email)
    {
        await using var scene = await PlantScene.CreateAsync();
        var outcome = await scene.Get<CreateAccount>().HandleAsync(Actor.Process("test"), email, "Somebody", "a long enough phrase", false);
        Assert.Equal(RefusalKind.Invalid, outcome.Refusal?.Kind);
    }

    [Fact]
    public async Task Reauthenticate_RightPassword_GivesProof_WrongOnesLockOut()
    {
        await using var scene = await PlantScene.CreateAsync();
        var made = await scene.Get<CreateAccount>().HandleAsync(Actor.Of(scene.Company.Id), "somebody@plant.example", "Somebody", "a long enough phrase", false);
        Assert.True(made.Succeeded, made.Refusal?.Message);
        var actor = Actor.Of(made.Value);
        var reauthenticate = scene.Get<Reauthenticate>();

        Assert.Equal(made.Value, (await reauthenticate.HandleAsync(actor, "a long enough phrase")).Value.AccountId);

        for (var i = 0; i < 10; i++)
            Assert.Equal(RefusalKind.NotReauthenticated, (await reauthenticate.HandleAsync(actor, "a wrong phrase " + i)).Refusal?.Kind);
        Assert.False((await reauthenticate.HandleAsync(actor, "a long enough phrase")).Succeeded);
    }

    [Fact]
    public async Task SetPlantRole_OfOneself_NeedsAnotherAdministrator()
    {
        await using var scene = await PlantScene.CreateAsync();
        var outcome = await scene.Get<SetPlantRole>().HandleAsync(
            Actor.Of(scene.Administrator.Id), scene.Administrator.Id, scene.Plant.Id, PathPortal.Portal.Domain.People.Role.Lead, given: true);
        Assert.Equal(RefusalKind.FourEyes, outcome.Refusal?.Kind);
    }

    [Fact]
    public async Task ActAsync_Refused_LeavesNothingBehind()
    {
        await using var scene = await PlantScene.CreateAsync();
        await scene.Db.ActAsync<int>(Actor.Process("test"), async session =>
        {
            (await session.Db.Users.SingleAsync(a => a.Id == scene.Viewer.Id)).DisplayName = "changed";
            await session.Db.SaveChangesAsync();
            return new Refusal(RefusalKind.Invalid, "after all");
        });
        Assert.Equal(0L, await scene.SqlAsync("SELECT count(*) FROM accounts WHERE display_name = 'changed'"));
    }
}
