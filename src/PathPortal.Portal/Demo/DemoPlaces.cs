using Microsoft.EntityFrameworkCore;
using PathPortal.Portal.Data;

namespace PathPortal.Portal.Demo;

/// <summary>What of the demo is in the database already, by its names.</summary>
public sealed class DemoPlaces
{
    private readonly Dictionary<string, Guid> _people;

    private DemoPlaces(Dictionary<string, Guid> people) => _people = people;

    public required Dictionary<string, Guid> Plants { get; init; }

    public required Dictionary<string, Guid> Arms { get; init; }

    public required Dictionary<string, Guid> Criteria { get; init; }

    public required Dictionary<(string Plant, string Cell), Guid> Cells { get; init; }

    public required Dictionary<string, Guid> Parts { get; init; }

    /// <summary>Programs by name, with the number of their newest revision.</summary>
    public required Dictionary<string, (Guid Id, int Revisions)> Programs { get; init; }

    public static async Task<DemoPlaces> ReadAsync(PortalSession session, CancellationToken cancellation)
    {
        var data = session.Db;
        var cells = await (
            from cell in data.Cells
            join plant in data.Plants on cell.PlantId equals plant.Id
            select new { Plant = plant.Name, cell.Name, cell.Id }).ToListAsync(cancellation);
        var programs = await data.Programs.Select(p => new { p.Name, p.Id, p.LatestNumber }).ToListAsync(cancellation);
        return new(await data.Users.ToDictionaryAsync(u => u.Email!, u => u.Id, cancellation))
        {
            Plants = await data.Plants.ToDictionaryAsync(p => p.Name, p => p.Id, cancellation),
            Arms = await data.ArmModels.ToDictionaryAsync(a => a.Name, a => a.Id, cancellation),
            Criteria = await data.CriteriaSheets.ToDictionaryAsync(c => c.Name, c => c.Id, cancellation),
            Cells = cells.ToDictionary(c => (c.Plant, c.Name), c => c.Id),
            Parts = await data.Parts.ToDictionaryAsync(p => p.Name, p => p.Id, cancellation),
            Programs = programs.ToDictionary(p => p.Name, p => (p.Id, p.LatestNumber)),
        };
    }

    public Actor Person(string email) => Actor.Of(_people[email]);
}
