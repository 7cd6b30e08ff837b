using PathPortal.Portal.Handling.Programs;

namespace PathPortal.Portal.Demo;

/// <summary>Brings parts, programs, assignments and revisions of the invented company into the database; the workers simulate them.</summary>
public sealed class DemoUploads(CreatePart createPart, CreateProgram createProgram, AssignProgram assign, UploadRevision upload)
{
    // Reads every plant, so it may put a program of one on a cell of another.
    private const string Lead = "fenja@demo.example";

    /// <summary>Returns how many revisions were uploaded; what is there already stays.</summary>
    public async Task<int> LoadAsync(DemoPlaces places, CancellationToken cancellation)
    {
        var uploaded = 0;
        foreach (var program in DemoPrograms.All)
        {
            var (id, revisions) = places.Programs.TryGetValue(program.Name, out var known) ? known : (await CreateAsync(places, program, cancellation), 0);
            foreach (var revision in program.Revisions.Skip(revisions))
            {
                var result = await upload.HandleAsync(
                    places.Person(program.Author), id, revision.File, DemoPrograms.Read(revision.File), revision.Note, cancellation);
                if (result.Revision is null)
                    throw new InvalidOperationException($"The demo path {revision.File} was refused: {result.Refusal?.Message} {string.Join(" ", result.Problems)}");
                uploaded++;
            }
        }
        return uploaded;
    }

    private async Task<Guid> CreateAsync(DemoPlaces places, DemoProgram program, CancellationToken cancellation)
    {
        var author = places.Person(program.Author);
        if (!places.Parts.TryGetValue(program.Part, out var part))
        {
            part = DemoDefinitions.Done(await createPart.HandleAsync(author, program.Part, "Invented for the demo.", cancellation));
            places.Parts.Add(program.Part, part);
        }
        var id = DemoDefinitions.Done(await createProgram.HandleAsync(
            author, places.Plants[program.Plant], part, program.Name, program.Process, places.Criteria[program.Criteria], cancellation));
        foreach (var run in program.Runs)
            DemoDefinitions.Done(await assign.HandleAsync(places.Person(Lead), id, places.Cells[(run.Plant, run.Cell)], run.Terms, cancellation));
        return id;
    }
}
