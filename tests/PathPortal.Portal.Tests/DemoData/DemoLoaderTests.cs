using Microsoft.EntityFrameworkCore;
using PathPortal.Portal.Data;
using PathPortal.Portal.Demo;
using PathPortal.Portal.Tests.Support;
using PathPortal.TestSupport;

namespace PathPortal.Portal.Tests.DemoData;

public sealed class DemoLoaderTests
{
    [Fact]
    public async Task Load_Twice_ChangesNothingTheSecondTime()
    {
        await using var database = await TestDatabase.CreateAsync();
        await using var source = PortalData.OpenDataSource(database.Owner);
        var db = new PortalDb(PortalData.OptionsFor(source), TimeProvider.System);
        var folder = Directory.CreateTempSubdirectory("pathportal-demo-");
        try
        {
            var file = Path.Combine(folder.FullName, "passwords");
            await new DemoLoader(db, PortalData.CreateHasher()).LoadAsync(file, TestContext.Current.CancellationToken);
            var (text, rows) = (await File.ReadAllTextAsync(file, TestContext.Current.CancellationToken), await RowsAsync(database));

            await new DemoLoader(db, PortalData.CreateHasher()).LoadAsync(file, TestContext.Current.CancellationToken);

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
        await using var source = PortalData.OpenDataSource(database.Owner);
        var db = new PortalDb(PortalData.OptionsFor(source), TimeProvider.System);
        var folder = Directory.CreateTempSubdirectory("pathportal-demo-");
        try
        {
            var file = Path.Combine(folder.FullName, "passwords");
            var loader = new DemoLoader(db, PortalData.CreateHasher());
            await loader.LoadAsync(file, TestContext.Current.CancellationToken);
            File.Delete(file);

            await loader.LoadAsync(file, TestContext.Current.CancellationToken);

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

    private static async Task<object?> RowsAsync(TestDatabase database) => await PlantScene.SqlAsync(
        database.Superuser,
        "SELECT concat_ws(' ', (SELECT count(*) FROM accounts), (SELECT count(*) FROM plant_roles), (SELECT count(*) FROM history), (SELECT md5(string_agg(password_hash, '' ORDER BY id)) FROM accounts))");
}
