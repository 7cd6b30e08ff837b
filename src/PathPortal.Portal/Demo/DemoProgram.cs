using PathPortal.Portal.Domain.Programs;

namespace PathPortal.Portal.Demo;

/// <summary>One invented path program: who keeps it, what judges it, where it runs, and its revisions in order.</summary>
/// <param name="Author">E-mail of the person who uploads.</param>
public sealed record DemoProgram(
    string Plant, string Author, string Part, string Name, string Process, string Criteria,
    IReadOnlyList<DemoProgram.Run> Runs, IReadOnlyList<DemoProgram.Upload> Revisions)
{
    /// <summary>On which cell, with which tool and work frame.</summary>
    public sealed record Run(string Plant, string Cell, StartTerms Terms);

    /// <param name="File">Name of an embedded path file.</param>
    public sealed record Upload(string File, string Note);
}
