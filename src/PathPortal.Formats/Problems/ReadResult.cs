using System.Collections.Immutable;
using System.Diagnostics.CodeAnalysis;
using System.Globalization;

namespace PathPortal.Formats.Problems;

/// <summary>What reading gives back: a value with remarks, or the problems that prevent one. Bad input never throws.</summary>
public sealed class ReadResult<T>
    where T : class
{
    /// <summary>The value; null exactly when there are problems.</summary>
    public T? Value { get; private init; }

    /// <summary>At most <see cref="ReadLimits.ListedProblems"/> problems in the order of the source; empty when there is a value.</summary>
    public ImmutableArray<FormatProblem> Problems { get; private init; } = [];

    /// <summary>How many more problems there are than are listed.</summary>
    public int ProblemsNotListed { get; private init; }

    /// <summary>Reading stopped before the end of the source: there may be more problems than are counted.</summary>
    public bool Stopped { get; private init; }

    /// <summary>What a reader should know about an accepted file.</summary>
    public ImmutableArray<FormatRemark> Remarks { get; private init; } = [];

    [MemberNotNullWhen(true, nameof(Value))]
    public bool Ok => Value is not null;

    /// <summary>“and N more” when not every problem is listed, else empty.</summary>
    public string MoreText => ProblemsNotListed == 0
        ? ""
        : string.Create(CultureInfo.InvariantCulture, $"and {(Stopped ? "at least " : "")}{ProblemsNotListed} more");

    /// <summary>These problems as the result of a step that follows.</summary>
    public ReadResult<TOther> Refused<TOther>()
        where TOther : class => new() { Problems = Problems, ProblemsNotListed = ProblemsNotListed, Stopped = Stopped };

    internal static ReadResult<T> Of(FormatProblem problem) => new() { Problems = [problem] };

    internal static ReadResult<T> Of(T value, ProblemList list) => list.Any
        ? Refused(list)
        : new() { Value = value, Remarks = list.Remarks };

    internal static ReadResult<T> Refused(ProblemList list) =>
        new() { Problems = list.Problems, ProblemsNotListed = list.NotListed, Stopped = list.Stopped };
}
