using System.Text;
using Microsoft.EntityFrameworkCore;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.Runs;
using PathPortal.Portal.Handling.Programs;
using PathPortal.Portal.Jobs;
using PathPortal.Portal.Tests.Support;

namespace PathPortal.Portal.Tests.Handling;

public sealed class UploadRevisionTests
{
    [Fact]
    public async Task Handle_GoodFile_KeepsBytesAndQueuesARunPerCell()
    {
        await using var scene = await PlantScene.CreateAsync();
        var bytes = PlantScene.Path(1);

        var result = await scene.Get<UploadRevision>().HandleAsync(Actor.Of(scene.Author.Id), scene.Program.Id, "folder\\bead.csv", bytes, "first");

        Assert.True(result.Succeeded, result.Refusal?.Message);
        var (revision, run) = await scene.Db.ReadAsync(Actor.Process("test"), async s =>
            (await s.Db.Revisions.SingleAsync(), await s.Db.Runs.SingleAsync()));
        Assert.Equal(bytes, revision.Source);
        Assert.Equal(Convert.ToHexStringLower(System.Security.Cryptography.SHA256.HashData(bytes)), revision.Sha256);
        Assert.Equal(("bead.csv", 3, scene.Author.Id), (revision.FileName, revision.PointCount, revision.UploadedBy));
        Assert.Equal(RunState.Queued, run.State);
        Assert.NotNull(run.BatchId);
        Assert.Equal(1L, await scene.SqlAsync($"SELECT count(*) FROM {JobScheduler.TablePrefix}triggers"));
    }

    public static TheoryData<string, string> BadFiles() => new()
    {
        { "nothing", "" },
        { "no table", "hello" },
        { "one point", Header + "0,0,0,180,0,0,straight,100,on\n" },
        { "not a number", Header + "0,0,0,180,0,0,straight,100,on\nNaN,0,0,180,0,0,straight,100,on\n" },
        { "too large a number", Header + "0,0,0,180,0,0,straight,100,on\n1e400,0,0,180,0,0,straight,100,on\n" },
    };

    private const string Header = "x_mm,y_mm,z_mm,fixed_xyz_1_deg,fixed_xyz_2_deg,fixed_xyz_3_deg,motion,speed_mm_s,process\n";

    [Theory]
    [MemberData(nameof(BadFiles))]
    public async Task Handle_BadFile_LeavesNothingBehind(string what, string text)
    {
        await using var scene = await PlantScene.CreateAsync();

        var result = await scene.Get<UploadRevision>().HandleAsync(Actor.Of(scene.Author.Id), scene.Program.Id, "bead.csv", Encoding.UTF8.GetBytes(text), "");

        Assert.False(result.Succeeded, what);
        Assert.Equal(RefusalKind.Invalid, result.Refusal.Kind);
        Assert.NotEmpty(result.Problems);
        Assert.Equal(0L, await scene.SqlAsync("SELECT (SELECT count(*) FROM revisions) + (SELECT count(*) FROM runs) + (SELECT count(*) FROM history)"));
    }

    [Fact]
    public async Task Handle_SameBytesAgain_IsRefused()
    {
        await using var scene = await PlantScene.CreateAsync();
        await scene.UploadAsync(1);
        var again = await scene.Get<UploadRevision>().HandleAsync(Actor.Of(scene.Author.Id), scene.Program.Id, "bead.csv", PlantScene.Path(1), "");
        Assert.Equal(RefusalKind.Invalid, again.Refusal?.Kind);
    }

    [Fact]
    public async Task Handle_InputsSimulatedBefore_SharesTheRun()
    {
        await using var scene = await PlantScene.CreateAsync();
        await scene.UploadAsync(1);
        await scene.UploadAsync(2);
        var back = await scene.UploadAsync(1);

        Assert.Equal(3, back.Number);
        Assert.Equal(2L, await scene.SqlAsync("SELECT count(*) FROM runs"));
        Assert.Equal(3L, await scene.SqlAsync("SELECT count(*) FROM run_requests"));
    }

    [Fact]
    public async Task Handle_SetupThatNoLongerFits_KeepsTheRevisionAndSaysWhy()
    {
        await using var scene = await PlantScene.CreateAsync();
        await scene.SqlAsync("SET session_replication_role = replica; UPDATE assignments SET tool_name = 'gone'");

        var uploaded = await scene.UploadAsync(1);

        var request = Assert.Single(uploaded.Requests);
        Assert.Null(request.RunId);
        Assert.Contains("gone", request.Problem, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("")]
    [InlineData("bead\u202Evsc.exe")]
    [InlineData("bead\u0007.csv")]
    public async Task Handle_FileNameThatHides_IsRefused(string name)
    {
        await using var scene = await PlantScene.CreateAsync();
        var result = await scene.Get<UploadRevision>().HandleAsync(Actor.Of(scene.Author.Id), scene.Program.Id, name, PlantScene.Path(1), "");
        Assert.Equal(RefusalKind.Invalid, result.Refusal?.Kind);
    }
}
