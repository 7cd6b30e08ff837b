using System.Globalization;
using Microsoft.EntityFrameworkCore;
using PathPortal.Formats.Paths;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.History;
using PathPortal.Portal.Domain.People;
using PathPortal.Portal.Domain.Programs;
using PathPortal.Portal.Domain.Runs;
using PathPortal.Portal.Handling.Runs;
using PathPortal.Portal.Jobs;

namespace PathPortal.Portal.Handling.Programs;

/// <summary>Keeps a path file as a program's next revision and asks for its runs on every cell, in one transaction: all of it or nothing.</summary>
public sealed class UploadRevision(PortalDb db, RunRequester requester)
{
    private const string What = "program";

    /// <param name="bytes">The file as it came; kept for ever.</param>
    public async Task<UploadResult> HandleAsync(
        Actor actor, Guid programId, string fileName, byte[] bytes, string note, CancellationToken cancellation = default)
    {
        ArgumentNullException.ThrowIfNull(bytes);
        var named = FileNames.Parse(fileName);
        var noted = Names.Note(note);
        if ((named.Refusal ?? noted.Refusal) is { } wrong)
            return UploadResult.Refused(wrong);
        // Whoever may not upload learns nothing about the file, and costs no reading of it.
        if (await db.ReadAsync(actor, s => RefuseAsync(s, programId, cancellation), cancellation) is { } refusal)
            return UploadResult.Refused(refusal);
        var read = PathCsv.Read(bytes);
        if (!read.Ok)
            return UploadResult.Unreadable(read);

        var file = read.Value;
        var source = new RevisionSource(named.Value, "csv", bytes);
        var facts = RevisionFactsOf.File(file, [.. read.Remarks.Select(r => r.ToString())]);
        var outcome = await db.ActAsync<UploadedRevision>(actor, async session =>
        {
            if (await RefuseAsync(session, programId, cancellation) is { } refused)
                return refused;
            var program = await session.Db.Programs.SingleAsync(p => p.Id == programId, cancellation);
            var digest = Sha256Text.Of(bytes);
            if (await session.Db.Revisions.AnyAsync(r => r.ProgramId == programId && r.Number == program.LatestNumber && r.Sha256 == digest, cancellation))
                return new Refusal(RefusalKind.Invalid, $"The file is the same, byte for byte, as revision {Number(program.LatestNumber)}.");

            var revision = program.AddRevision(source, facts, noted.Value, actor.AccountId!.Value, session.Now);
            session.Db.Revisions.Add(revision);
            var assignments = await session.Db.Assignments
                .Where(a => a.ProgramId == programId && a.RetiredAt == null && session.Db.Cells.Any(c => c.Id == a.CellId && c.RetiredAt == null))
                .Select(a => a.Id).ToListAsync(cancellation);
            var requests = await requester.RequestAsync(
                session, revision, file.Path, assignments, actor.AccountId, RunPriority.Interactive, cancellation);
            session.Tell(HistoryDraft.Of(program.PlantId, "revision", revision.Id, "uploaded",
                ("program", program.Name), ("revision", Number(revision.Number)), ("file", revision.FileName), ("sha256", revision.Sha256),
                ("cells", Number(requests.Count)), ("note", noted.Value)));
            return new UploadedRevision(revision.Id, revision.Number, requests);
        }, cancellation);
        return outcome.Succeeded ? UploadResult.Kept(outcome.Value, read) : UploadResult.Refused(outcome.Refusal);
    }

    private static async Task<Refusal?> RefuseAsync(PortalSession session, Guid programId, CancellationToken cancellation)
    {
        var program = await session.Db.Programs.Where(p => p.Id == programId).Select(p => new { p.PlantId, p.RetiredAt }).SingleOrDefaultAsync(cancellation);
        if (program is null)
            return Refusal.NotFound(What);
        if ((await session.AccessAsync(cancellation)).Refuse(program.PlantId, Right.UploadRevision, What) is { } refusal)
            return refusal;
        return program.RetiredAt is null ? null : new(RefusalKind.WrongState, "The program is retired and takes no new revision.");
    }

    private static string Number(int value) => value.ToString(CultureInfo.InvariantCulture);
}
