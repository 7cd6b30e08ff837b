using Microsoft.EntityFrameworkCore;
using PathPortal.Formats.Documents;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Handling.Fleet;

namespace PathPortal.Portal.Demo;

/// <summary>Brings arm models, criteria sheets and cells of the invented company into the database, through the handlers its people use.</summary>
public sealed class DemoDefinitions(PortalDb db, SaveArmModel saveArm, SaveCriteriaSheet saveCriteria, AddCell addCell, SaveCellSetup saveSetup)
{
    private const string Lead = "fenja@demo.example";

    private static readonly Dictionary<string, string> Owners = new()
    {
        [DemoCompany.Tarnhus] = "doran@demo.example",
        [DemoCompany.Brevola] = "cilia@demo.example",
        [DemoCompany.Osmeda] = "elmo@demo.example",
    };

    /// <summary>Returns how many cells were made; what is there already stays.</summary>
    public async Task<int> LoadAsync(DemoPlaces places, CancellationToken cancellation)
    {
        var arms = await ArmsAsync(places, cancellation);
        await CriteriaAsync(places, cancellation);
        var made = 0;
        foreach (var cell in DemoFleet.Cells.Where(c => !places.Cells.ContainsKey((c.Plant, c.Name))))
        {
            var owner = places.Person(Owners[cell.Plant]);
            var id = Done(await addCell.HandleAsync(owner, places.Plants[cell.Plant], cell.Name, cancellation));
            Done(await saveSetup.HandleAsync(owner, id, 0, arms[cell.Arm], cell.Setup, cell.Note, cancellation));
            places.Cells.Add((cell.Plant, cell.Name), id);
            made++;
        }
        return made;
    }

    internal static T Done<T>(Outcome<T> outcome)
        where T : notnull => outcome.Succeeded ? outcome.Value : throw new InvalidOperationException("The demo was refused: " + outcome.Refusal.Message);

    private async Task<Dictionary<string, Guid>> ArmsAsync(DemoPlaces places, CancellationToken cancellation)
    {
        foreach (var arm in (ArmDocument[])[DemoArms.Bench(), DemoArms.Floor(), DemoArms.Track()])
        {
            if (!places.Arms.ContainsKey(arm.Name))
                places.Arms.Add(arm.Name, Done(await saveArm.HandleAsync(places.Person(Lead), null, null, arm, "Invented for the demo.", cancellation)));
        }
        return await db.ReadAsync(places.Person(Lead), session => (
            from version in session.Db.ArmModelVersions
            join arm in session.Db.ArmModels on version.ArmModelId equals arm.Id
            where version.Number == arm.LatestNumber
            select new { arm.Name, version.Id }).ToDictionaryAsync(v => v.Name, v => v.Id, cancellation), cancellation);
    }

    private async Task CriteriaAsync(DemoPlaces places, CancellationToken cancellation)
    {
        foreach (var (name, sheet) in DemoCriteria.All)
        {
            if (!places.Criteria.ContainsKey(name))
                places.Criteria.Add(name, Done(await saveCriteria.HandleAsync(places.Person(Lead), null, null, name, sheet, "Invented for the demo.", cancellation)));
        }
    }
}
