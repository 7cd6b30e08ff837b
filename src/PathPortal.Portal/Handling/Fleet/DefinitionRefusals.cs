using PathPortal.Formats.Problems;
using PathPortal.Portal.Domain;

namespace PathPortal.Portal.Handling.Fleet;

/// <summary>Refusals that the definitions (arm models, cell setups, criteria sheets) share.</summary>
internal static class DefinitionRefusals
{
    /// <summary>Null when the document holds; else its first problems in words.</summary>
    public static Refusal? OfProblems(IReadOnlyList<FormatProblem> problems) => problems.Count == 0
        ? null
        : new(RefusalKind.Invalid, string.Join(" ", problems.Take(3)) + (problems.Count > 3 ? $" And {problems.Count - 3} more." : ""));

    /// <summary>Null when nobody saved a newer version meanwhile.</summary>
    public static Refusal? OfVersion(int latest, int? basedOn, string what) => basedOn is null || basedOn == latest
        ? null
        : new(RefusalKind.Stale, $"Version {latest} of this {what} was saved meanwhile; your changes start from version {basedOn}. Look at what changed and make yours again.");

    public static Refusal Retired(string what) => new(RefusalKind.WrongState, $"This {what} is retired and takes no new version.");

    public static Refusal NothingChanged(string what) => new(RefusalKind.Invalid, $"Nothing differs from the newest version of this {what}; there is nothing to save.");
}
