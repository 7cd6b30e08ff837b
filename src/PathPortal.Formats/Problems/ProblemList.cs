using System.Collections.Immutable;

namespace PathPortal.Formats.Problems;

/// <summary>Collects problems and remarks while one source is read; keeps the first ones and counts the rest.</summary>
internal sealed class ProblemList
{
    private readonly ImmutableArray<FormatProblem>.Builder _problems = ImmutableArray.CreateBuilder<FormatProblem>();
    private readonly ImmutableArray<FormatRemark>.Builder _remarks = ImmutableArray.CreateBuilder<FormatRemark>();

    public bool Any => Count > 0;

    public int Count { get; private set; }

    /// <summary>Reading stopped before the end, so there may be more problems than were counted.</summary>
    public bool Stopped { get; private set; }

    public int NotListed => Count - _problems.Count;

    public ImmutableArray<FormatProblem> Problems => _problems.ToImmutable();

    public ImmutableArray<FormatRemark> Remarks => _remarks.ToImmutable();

    /// <summary>Adds a problem; value and field may be raw text from the source, they are made showable here.</summary>
    public void Add(int line, int column, string field, string value, string expected, string message)
    {
        Count++;
        if (_problems.Count < ReadLimits.ListedProblems)
        {
            _problems.Add(new(line, column, VisibleText.Of(field, 120), VisibleText.Of(value), expected, message));
        }
    }

    public void Add(FormatProblem problem) =>
        Add(problem.Line, problem.Column, problem.Field, problem.Value, problem.Expected, problem.Message);

    public void Stop() => Stopped = true;

    public void Remark(int line, int column, string field, string message)
    {
        if (_remarks.Count < ReadLimits.ListedRemarks)
        {
            _remarks.Add(new(line, column, VisibleText.Of(field, 120), message));
        }
    }
}
