namespace PathPortal.Formats.Problems;

/// <summary>Something a reader should know about a file that was accepted.</summary>
/// <param name="Line">Line of the source, from 1; 0 when the whole file is meant.</param>
/// <param name="Column">Character of the line, from 1; 0 when there is none.</param>
/// <param name="Field">Column name, property path or element; empty when the whole file is meant.</param>
/// <param name="Message">The remark, as one or two sentences.</param>
public sealed record FormatRemark(int Line, int Column, string Field, string Message)
{
    /// <summary>Everything in one line.</summary>
    public override string ToString() =>
        (Line == 0 ? "" : Column == 0 ? $"Line {Line}: " : $"Line {Line}, column {Column}: ") + (Field.Length == 0 ? "" : Field + ": ") + Message;
}
