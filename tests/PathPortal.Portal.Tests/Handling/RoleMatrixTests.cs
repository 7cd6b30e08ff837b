using PathPortal.Formats.Documents;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.People;
using PathPortal.Portal.Handling.Fleet;
using PathPortal.Portal.Handling.People;
using PathPortal.Portal.Handling.Programs;
using PathPortal.Portal.Handling.Reviews;
using PathPortal.Portal.Tests.Jobs;
using PathPortal.Portal.Tests.Support;

namespace PathPortal.Portal.Tests.Handling;

/// <summary>Every handler that changes something × everybody there is. Who may is written down here a second time, apart from the code.</summary>
public sealed class RoleMatrixTests
{
    private static readonly string[] Everybody =
        ["author", "cell owner", "lead", "viewer", "administrator", "company", "stranger", "nobody", "disabled", "unknown"];

    private static readonly Dictionary<string, string> May = new()
    {
        ["upload a revision"] = "author, lead",
        ["create a program"] = "author, cell owner, lead",
        ["create a part"] = "author, cell owner, lead, stranger",
        ["assign a program"] = "author, cell owner, lead",
        ["attach a controller file"] = "author, cell owner, lead",
        ["submit for review"] = "author, lead",
        ["decide on a review"] = "cell owner, lead",
        ["withdraw a review"] = "author, cell owner, lead",
        ["add a cell"] = "cell owner",
        ["save a setup"] = "cell owner",
        ["save an arm model"] = "cell owner, lead, stranger",
        ["save a criteria sheet"] = "lead, stranger",
        ["give a role"] = "administrator, company",
        ["found a plant"] = "company",
        ["disable an account"] = "company",
    };

    public static TheoryData<string> Actions() => [.. May.Keys];

    [Theory]
    [MemberData(nameof(Actions))]
    public async Task Handler_ByEverybody_ObeysTheTable(string action)
    {
        await using var scene = await PlantScene.CreateAsync();
        // Uploaded and submitted by somebody who is not in the table, so that four eyes stand in nobody's way.
        var review = await scene.SubmitAsync(1, scene.SecondAuthor, scene.SecondAuthor);
        var revision = (await scene.ReviewAsync(review)).RevisionId;
        var newer = await scene.UploadAsync(2, scene.SecondAuthor);
        await scene.FinishRunsAsync();
        var seen = await scene.EvidenceAsync(review);
        var spare = await scene.Get<CreateProgram>().HandleAsync(
            Actor.Of(scene.SecondAuthor.Id), scene.Plant.Id, scene.Part.Id, "Invented spare", "sealing", scene.Sheet.Id);
        var told = (long)(await scene.SqlAsync("SELECT count(*) FROM history"))!;

        // Those who may not come first: what they try must leave everything as it is for those who may.
        var allowed = May[action].Split(", ");
        foreach (var who in Everybody.OrderBy(w => allowed.Contains(w)))
        {
            var account = await AccountAsync(scene, who);
            var before = await scene.SqlAsync("SELECT count(*) FROM history");

            var refusal = await TryAsync(scene, action, account, review, revision, newer.Id, spare.Value, seen);

            if (allowed.Contains(who))
            {
                Assert.True(refusal is null or { Kind: RefusalKind.WrongState or RefusalKind.Invalid or RefusalKind.Stale }, $"{who} may {action}: {refusal}");
                continue;
            }
            Assert.True(refusal is not null, $"{who} could {action}.");
            // Strangers must not learn whether a thing exists.
            var expected = who is "stranger" or "nobody" && !IsCompanyWide(action) ? RefusalKind.NotFound : RefusalKind.NotAllowed;
            Assert.True(refusal.Kind == expected, $"{who}, {action}: {refusal}");
            Assert.Equal(before, await scene.SqlAsync("SELECT count(*) FROM history"));
        }
        Assert.True((long)(await scene.SqlAsync("SELECT count(*) FROM history"))! > told, $"Nobody could {action}.");
    }

    private static bool IsCompanyWide(string action) =>
        action is "create a part" or "save an arm model" or "save a criteria sheet" or "found a plant" or "disable an account";

    private static async Task<Account> AccountAsync(PlantScene scene, string who)
    {
        switch (who)
        {
            case "disabled":
                await scene.SqlAsync("UPDATE accounts SET disabled_at = now() WHERE id = $1", scene.SecondLead.Id);
                return scene.SecondLead;
            case "unknown":
                return new Account("unknown@plant.example", "unknown", TimeProvider.System.GetUtcNow());
            default:
                return who switch
                {
                    "author" => scene.Author,
                    "cell owner" => scene.CellOwner,
                    "lead" => scene.Lead,
                    "viewer" => scene.Viewer,
                    "administrator" => scene.Administrator,
                    "company" => scene.Company,
                    "stranger" => scene.Stranger,
                    _ => scene.Nobody,
                };
        }
    }

    private static async Task<Refusal?> TryAsync(
        PlantScene scene, string action, Account account, Guid review, Guid revision, Guid newer, Guid spare, PathPortal.Portal.Domain.Reviews.Evidence seen)
    {
        var actor = Actor.Of(account.Id);
        var name = "Invented " + Guid.NewGuid().ToString("N");
        return action switch
        {
            "upload a revision" => (await scene.Get<UploadRevision>().HandleAsync(actor, scene.Program.Id, "bead.csv", PlantScene.Path(name.GetHashCode(StringComparison.Ordinal) % 1000), "")).Refusal,
            "create a program" => (await scene.Get<CreateProgram>().HandleAsync(actor, scene.Plant.Id, scene.Part.Id, name, "sealing", scene.Sheet.Id)).Refusal,
            "create a part" => (await scene.Get<CreatePart>().HandleAsync(actor, name, "")).Refusal,
            "assign a program" => (await scene.Get<AssignProgram>().HandleAsync(actor, spare, scene.Cell.Id, PlantScene.Terms)).Refusal,
            "attach a controller file" => (await scene.Get<AttachControllerFile>().HandleAsync(actor, revision, scene.Cell.Id, "bead.prg", [1])).Refusal,
            "submit for review" => (await scene.Get<SubmitForReview>().HandleAsync(actor, newer, scene.Assignment.Id, "")).Refusal,
            "decide on a review" => (await scene.DecideAsync(review, account, shown: seen)).Refusal,
            "withdraw a review" => (await scene.Get<WithdrawReview>().HandleAsync(actor, review, "because")).Refusal,
            "add a cell" => (await scene.Get<AddCell>().HandleAsync(actor, scene.Plant.Id, name)).Refusal,
            "save a setup" => (await scene.Get<SaveCellSetup>().HandleAsync(
                actor, scene.Cell.Id, 1, scene.ArmVersion.Id, CellSetupDocument.Read(JobScene.SetupJson(9)).Value!, "")).Refusal,
            "save an arm model" => (await scene.Get<SaveArmModel>().HandleAsync(
                actor, null, null, ArmDocument.Read(JobScene.ArmJson()).Value! with { Name = name }, "")).Refusal,
            "save a criteria sheet" => (await scene.Get<SaveCriteriaSheet>().HandleAsync(
                actor, null, null, name, new CriteriaDocument { AcrossToleranceMm = 2 }, "")).Refusal,
            "give a role" => (await scene.Get<SetPlantRole>().HandleAsync(actor, scene.Nobody.Id, scene.Plant.Id, Role.CellOwner, given: true)).Refusal,
            "found a plant" => (await scene.Get<CreatePlant>().HandleAsync(actor, name, "Etc/UTC")).Refusal,
            "disable an account" => (await scene.Get<DisableAccount>().HandleAsync(actor, scene.Viewer.Id, disabled: true)).Refusal,
            _ => throw new ArgumentOutOfRangeException(nameof(action), action, null),
        };
    }
}
