namespace PathPortal.Formats.Problems;

/// <summary>Refusals for reasons that lie outside a file's text, such as its size.</summary>
public static class Refused
{
    public static ReadResult<T> For<T>(FormatProblem problem)
        where T : class => ReadResult<T>.Of(problem);
}
