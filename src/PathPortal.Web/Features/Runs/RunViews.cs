using PathPortal.Engine.Verdicts;
using PathPortal.Formats.Documents;
using PathPortal.Portal.Data.Queries;
using PathPortal.Portal.Simulation;

namespace PathPortal.Web.Features.Runs;

/// <summary>From a run's row to what its page shows.</summary>
public static class RunViews
{
    public static RunView Of(RunDetails run)
    {
        var summary = RunSummaryJson.Read(run.Run.SummaryJson!);
        return new()
        {
            Id = run.Run.Id,
            Sentence = VerdictSentence.Of(summary.Verdict, summary.Outcomes),
            Summary = summary,
            Bins = run.Run.Bins is { } bins ? UseBinsCodec.Unpack(bins) : null,
            Arm = (ArmDocument.Read(run.ArmJson).Value ?? throw Unreadable("arm model")).ToArmModel(),
            Criteria = (CriteriaDocument.Read(run.CriteriaJson).Value ?? throw Unreadable("criteria sheet")).ToCriteriaSheet(),
            Inputs = InputsOf(run),
            Newer = run.NewerRunId,
        };
    }

    public static RunInputs InputsOf(RunDetails run) => new()
    {
        Program = new(run.Program.Name, $"/programs/{run.Program.Id}"),
        Revision = new($"revision {run.Revision.Number}", $"/programs/{run.Program.Id}?revision={run.Revision.Number}", run.Revision.Sha256),
        Cell = new(run.Cell.Name, $"/cells/{run.Cell.Id}"),
        Setup = new($"setup {run.Setup.Number}", $"/cells/{run.Cell.Id}", run.Setup.Sha256),
        Arm = new($"{run.Arm.Name}, version {run.ArmVersion.Number}", $"/arms/{run.Arm.Id}", run.ArmVersion.Sha256),
        Criteria = new($"{run.Criteria.Name}, version {run.CriteriaVersion.Number}", $"/criteria/{run.Criteria.Id}", run.CriteriaVersion.Sha256),
        Plant = run.At.Plant,
        Zone = run.At.TimeZone,
        Tool = run.ToolName,
        WorkFrame = run.WorkFrameName,
        Digest = run.Run.Digest,
        NumericsVersion = run.Run.NumericsVersion,
        FinishedAt = run.Run.FinishedAt,
        Worker = run.Run.WorkerName,
        Review = run.Review is { } review ? $"/reviews/{review}" : null,
    };

    private static InvalidOperationException Unreadable(string what) => new($"The stored {what} can no longer be read.");
}
