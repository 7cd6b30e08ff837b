using PathPortal.Engine;
using PathPortal.Engine.Verdicts;
using PathPortal.Portal.Domain.Fleet;
using PathPortal.Portal.Domain.People;
using PathPortal.Portal.Domain.Programs;
using PathPortal.Portal.Domain.Reviews;
using PathPortal.Portal.Domain.Runs;
using PathPortal.Portal.Simulation;

namespace PathPortal.Web.Tests.Support;

/// <summary>An invented company with programs in every state, written straight into the tables: for pages that only read.</summary>
public sealed class SampleCompany
{
    private static readonly DateTimeOffset At = new(2026, 3, 2, 9, 0, 0, TimeSpan.Zero);
    private readonly People _people;
    private int _digests;

    private SampleCompany(People people) => _people = people;

    public Plant Harbour { get; private set; } = null!;
    public Plant Hill { get; private set; } = null!;
    public Account Author { get; private set; } = null!;
    public Account Owner { get; private set; } = null!;
    public Account Stranger { get; private set; } = null!;
    public Account Lead { get; private set; } = null!;

    /// <summary>Submitted by the lead, whose role may also approve.</summary>
    public Review LeadsReview { get; private set; } = null!;

    /// <summary>In review although its run fails.</summary>
    public Review FailingReview { get; private set; } = null!;
    public PathProgram Sealing { get; private set; } = null!;
    public Review InReview { get; private set; } = null!;

    public static async Task<SampleCompany> MakeAsync(People people)
    {
        var company = new SampleCompany(people);
        await company.FillAsync();
        return company;
    }

    private async Task FillAsync()
    {
        Harbour = await _people.PlantAsync("Harbour works");
        Hill = await _people.PlantAsync("Hill works", approvals: 2);
        Author = await _people.AccountAsync("author@plant.example", "Ada Author", (Harbour, Role.Author), (Hill, Role.Author));
        Owner = await _people.AccountAsync("owner@plant.example", "Owen Owner", (Harbour, Role.CellOwner), (Hill, Role.CellOwner));
        Lead = await _people.AccountAsync("lead@plant.example", "Lena Lead", (Harbour, Role.Lead), (Hill, Role.Lead));
        var elsewhere = await _people.PlantAsync("Elsewhere");
        Stranger = await _people.AccountAsync("stranger@plant.example", "Sam Stranger", (elsewhere, Role.Lead));

        var arm = new ArmModelRecord("Long six-joint arm (invented)", At);
        var armVersion = arm.AddVersion(StoredDocument.Of("{}"), "", Owner.Id, At);
        var sheet = new CriteriaSheetRecord("Sealing, standard", At);
        var sheetVersion = sheet.AddVersion(StoredDocument.Of("{}"), "", Owner.Id, At);
        Cell[] cells = [new(Harbour.Id, "North 1", At), new(Harbour.Id, "North 2", At), new(Hill.Id, "Line A", At), new(Hill.Id, "Line B", At)];
        var setups = cells.Select(c => c.AddSetup(armVersion.Id, StoredDocument.Of("{}"), "", Owner.Id, At)).ToList();
        Part[] parts = [new("Door frame, left", "", At), new("Cover plate", "", At)];
        await _people.SaveAsync([arm, armVersion, sheet, sheetVersion, .. cells, .. setups, .. parts]);

        Sealing = Program(Harbour, parts[0], "Door seam, outer", "sealing", sheet);
        var deburring = Program(Harbour, parts[1], "Cover edge", "deburring", sheet);
        var drilling = Program(Hill, parts[1], "Cover holes", "drilling", sheet);
        var first = Revision(Sealing, "first path");
        var second = Revision(Sealing, "corner slowed down beside the wrist");
        var edge = Revision(deburring, "");
        var assignments = cells.Take(3).Select(c => Assign(Sealing, c)).ToList();
        var edgeAssignments = cells.Skip(1).Select(c => Assign(deburring, c)).ToList();
        await _people.SaveAsync([Sealing, deburring, drilling, first, second, edge, .. assignments, .. edgeAssignments]);

        for (var i = 0; i < assignments.Count; i++)
        {
            await RequestAsync(first, assignments[i], setups[i], sheetVersion, cells[i].PlantId, Verdict.Fail, 1.31 + (i / 10.0), Criterion.JointSpeed);
            var (verdict, use, criterion) = i switch { 0 => (Verdict.Pass, 0.62, Criterion.AcrossPath), 1 => (Verdict.Pass, 0.93, Criterion.JointSpeed), _ => (Verdict.Fail, 1.07, Criterion.JointPosition) };
            await RequestAsync(second, assignments[i], setups[i], sheetVersion, cells[i].PlantId, verdict, use, criterion);
        }
        await RequestAsync(edge, edgeAssignments[0], setups[1], sheetVersion, Harbour.Id, Verdict.NotAssessable, null, null);
        await RunningAsync(edge, edgeAssignments[1], setups[2], sheetVersion, Hill.Id);
        await _people.SaveAsync(new RunRequest(null, "The setup of Line B has no tool named “sealing gun”.", edge.Id, edgeAssignments[2].Id, setups[3].Id, sheetVersion.Id, Author.Id, At));

        InReview = new Review(Harbour.Id, second.Id, assignments[0].Id, At);
        InReview.Submit(Author.Id, 1, "Same speed as before except in the corner.", At.AddHours(1));
        LeadsReview = new Review(Harbour.Id, second.Id, assignments[1].Id, At);
        LeadsReview.Submit(Lead.Id, 1, "", At.AddHours(2));
        FailingReview = new Review(Hill.Id, second.Id, assignments[2].Id, At);
        FailingReview.Submit(Author.Id, 1, "To be seen, not to be approved.", At.AddHours(3));
        foreach (var review in new[] { InReview, LeadsReview, FailingReview })
            await _people.SaveAsync([review, .. review.Transitions]);
    }

    private PathProgram Program(Plant plant, Part part, string name, string process, CriteriaSheetRecord sheet) =>
        new(plant.Id, part.Id, name, process, sheet.Id, Author.Id, At);

    private Revision Revision(PathProgram program, string note) => program.AddRevision(
        new("path.csv", "csv", System.Text.Encoding.UTF8.GetBytes($"x_mm,y_mm,z_mm\n# {program.Name} {program.LatestNumber}\n0,0,0\n")),
        new(1842, 3.482, 21.4, [-0.4, 0, 0.1], [0.9, 0.35, 0.62], ["No label on any point."]), note, Author.Id, At.AddDays(program.LatestNumber));

    private Assignment Assign(PathProgram program, Cell cell) => new(program.Id, cell.Id, new("sealing gun", "fixture", null, null), Owner.Id, At);

    private async Task RequestAsync(Revision revision, Assignment assignment, CellSetup setup, CriteriaSheetVersion sheet, Guid plant, Verdict verdict, double? use, Criterion? criterion)
    {
        var run = NewRun(plant);
        run.Start("worker", At);
        run.Complete(new RunConclusion(verdict, use, criterion, 23.6, RunSummaryJson.Write(Summary(verdict, use, criterion)), null), At.AddSeconds(2));
        await _people.SaveAsync(run, new RunRequest(run, null, revision.Id, assignment.Id, setup.Id, sheet.Id, Author.Id, At.AddMinutes(_digests)));
    }

    private async Task RunningAsync(Revision revision, Assignment assignment, CellSetup setup, CriteriaSheetVersion sheet, Guid plant)
    {
        var run = NewRun(plant);
        run.Start("worker", At);
        run.Advance(0.4);
        await _people.SaveAsync(run, new RunRequest(run, null, revision.Id, assignment.Id, setup.Id, sheet.Id, Author.Id, At));
    }

    private static RunSummary Summary(Verdict verdict, double? use, Criterion? worst)
    {
        var judged = new[] { Criterion.AcrossPath, Criterion.JointPosition, Criterion.JointSpeed, Criterion.Singularity };
        return new RunSummary
        {
            NumericsVersion = 1,
            Verdict = verdict,
            Outcomes =
            [
                .. judged.Select((c, i) => OutcomeOf(c, use is null ? null : c == worst ? use : 0.2 + (0.15 * i))),
                new CriterionOutcome { Criterion = Criterion.Finished, Status = CriterionStatus.Pass, Binding = true, NearThreshold = 0.8 },
            ],
            Findings = [],
            Postures = [],
            PostureChoice = "The only posture.",
            SampleCount = 5901,
            Period = 0.004,
            CycleTime = 23.6,
            PlannedTime = 21.4,
            PathLength = 3.482,
            CharacteristicLength = 1,
            Extremes = new RunExtremes(),
            Remarks = [],
        };
    }

    private static CriterionOutcome OutcomeOf(Criterion criterion, double? use) => new()
    {
        Criterion = criterion,
        Binding = criterion != Criterion.Singularity,
        Status = use switch { null => CriterionStatus.NotAssessable, > 1 => CriterionStatus.Fail, >= 0.8 => CriterionStatus.Near, _ => CriterionStatus.Pass },
        WorstUse = use,
        Place = use is null ? null : new Place(2210, 8.84, 0.37, 641),
        Joint = criterion is Criterion.JointPosition or Criterion.JointSpeed ? 4 : null,
        Value = use * 0.001,
        LimitValue = use is null ? null : 0.001,
        Unit = criterion == Criterion.JointSpeed ? "rad/s" : criterion == Criterion.JointPosition ? "rad" : criterion == Criterion.Singularity ? "1" : "m",
        Reason = use is null ? "The path has no process section." : null,
        NearThreshold = 0.8,
    };

    private Run NewRun(Guid plant) => new(plant, Portal.Domain.Sha256Text.Of($"sample {++_digests}"), 1, At);
}
