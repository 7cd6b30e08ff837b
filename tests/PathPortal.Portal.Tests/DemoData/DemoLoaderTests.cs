using Microsoft.EntityFrameworkCore;
using Microsoft.Extensions.DependencyInjection;
using PathPortal.Portal.Data;
using PathPortal.Portal.Demo;
using PathPortal.Portal.Handling;
using PathPortal.Portal.Jobs;
using PathPortal.Portal.Tests.Support;
using PathPortal.TestSupport;

namespace PathPortal.Portal.Tests.DemoData;

public sealed class DemoLoaderTests
{
    [Fact]
    public async Task Load_Twice_ChangesNothingTheSecondTime()
    {
        await using var database = await TestDatabase.CreateAsync();
        await using var services = Services(database);
        var folder = Directory.CreateTempSubdirectory("pathportal-demo-");
        try
        {
            var file = Path.Combine(folder.FullName, "passwords");
            await LoadAsync(services, file);
            var (text, rows) = (await File.ReadAllTextAsync(file, TestContext.Current.CancellationToken), await RowsAsync(database));

            await LoadAsync(services, file);

            Assert.Equal(text, await File.ReadAllTextAsync(file, TestContext.Current.CancellationToken));
            Assert.Equal(rows, await RowsAsync(database));
            if (!OperatingSystem.IsWindows())
                Assert.Equal(UnixFileMode.UserRead | UnixFileMode.UserWrite, File.GetUnixFileMode(file));
        }
        finally
        {
            folder.Delete(recursive: true);
        }
    }

    [Fact]
    public async Task Load_PasswordsFileLost_GivesPasswordsThatWork()
    {
        await using var database = await TestDatabase.CreateAsync();
        await using var services = Services(database);
        var db = services.GetRequiredService<PortalDb>();
        var folder = Directory.CreateTempSubdirectory("pathportal-demo-");
        try
        {
            var file = Path.Combine(folder.FullName, "passwords");
            await LoadAsync(services, file);
            File.Delete(file);

            await LoadAsync(services, file);

            var line = (await File.ReadAllLinesAsync(file, TestContext.Current.CancellationToken)).First(l => !l.StartsWith('#'))
                .Split(' ', StringSplitOptions.RemoveEmptyEntries);
            var account = await db.ReadAsync(Actor.Process("test"), s => s.Db.Users.SingleAsync(a => a.Email == line[0]));
            Assert.NotEqual(
                Microsoft.AspNetCore.Identity.PasswordVerificationResult.Failed,
                PortalData.CreateHasher().VerifyHashedPassword(account, account.PasswordHash!, line[1]));
        }
        finally
        {
            folder.Delete(recursive: true);
        }
    }

    private static ServiceProvider Services(TestDatabase database) => new ServiceCollection()
        .AddLogging().AddPortalData(database.Owner).AddRunQueue().AddPortalHandlers().AddDemo().BuildServiceProvider();

    private static async Task LoadAsync(ServiceProvider services, string file)
    {
        await using var scope = services.CreateAsyncScope();
        await scope.ServiceProvider.GetRequiredService<DemoLoader>().LoadAsync(file, TestContext.Current.CancellationToken);
    }

    private static async Task<object?> RowsAsync(TestDatabase database) => await PlantScene.SqlAsync(
        database.Superuser,
        "SELECT concat_ws(' ', (SELECT count(*) FROM accounts), (SELECT count(*) FROM plant_roles), (SELECT count(*) FROM history), (SELECT count(*) FROM revisions), (SELECT count(*) FROM runs), (SELECT md5(string_agg(password_hash, '' ORDER BY id)) FROM accounts))");
}
