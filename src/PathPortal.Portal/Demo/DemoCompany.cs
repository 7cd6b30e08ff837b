using PathPortal.Portal.Domain.People;

namespace PathPortal.Portal.Demo;

/// <summary>The invented company: three plants and the people who work there. Nobody and nothing here exists.</summary>
public static class DemoCompany
{
    public const string Tarnhus = "Tarnhus (invented)";
    public const string Brevola = "Brevola (invented)";
    public const string Osmeda = "Osmeda (invented)";

    public static IReadOnlyList<DemoPlant> Plants { get; } =
    [
        new(Tarnhus, "Europe/Stockholm", 1, Role.CellOwner, Role.Lead),
        new(Brevola, "America/Sao_Paulo", 1, Role.CellOwner, Role.Lead),
        new(Osmeda, "Europe/Prague", 2, Role.CellOwner, Role.Lead),
    ];

    public static IReadOnlyList<DemoPerson> People { get; } =
    [
        new("asta@demo.example", "Asta Lindqvorn", false, "process engineer: uploads and submits", (Tarnhus, [Role.Author]), (Brevola, [Role.Author])),
        new("boro@demo.example", "Boro Venkalis", false, "process engineer", (Osmeda, [Role.Author]), (Tarnhus, [Role.Viewer])),
        new("cilia@demo.example", "Cilia Marquento", false, "cell owner: keeps cells true, approves", (Brevola, [Role.CellOwner])),
        new("doran@demo.example", "Doran Ekstubben", false, "cell owner: keeps cells true, approves", (Tarnhus, [Role.CellOwner])),
        new("elmo@demo.example", "Elmo Hradvari", false, "cell owner: keeps cells true, approves", (Osmeda, [Role.CellOwner])),
        new("fenja@demo.example", "Fenja Oduwari", false, "lead engineer of all plants: sets criteria, approves",
            (Tarnhus, [Role.Lead]), (Brevola, [Role.Lead]), (Osmeda, [Role.Lead])),
        new("gitta@demo.example", "Gitta Palvoren", false, "auditor: reads everything, changes nothing",
            (Tarnhus, [Role.Viewer]), (Brevola, [Role.Viewer]), (Osmeda, [Role.Viewer])),
        new("hanno@demo.example", "Hanno Westerlok", true, "administrator: plants, accounts, roles",
            (Tarnhus, [Role.Administrator]), (Brevola, [Role.Administrator]), (Osmeda, [Role.Administrator])),
    ];
}
