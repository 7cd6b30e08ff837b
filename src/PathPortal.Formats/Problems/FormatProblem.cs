namespace PathPortal.Formats.Problems;

/// <summary>One reason why a file or a form was refused. Every text in it is safe to show: control and direction characters are written out.</summary>
/// <param name="Line">Line of the source, from 1; 0 when the value comes from a form.</param>
/// <param name="Column">Character of the line at which the value starts, from 1 (UTF-16 units); 0 when there is none.</param>
/// <param name="Field">Column name of a table, property path of a document, element of an XML file; empty when the whole file is meant.</param>
/// <param name="Value">The offending value, shortened; empty when a value is missing.</param>
/// <param name="Expected">What should have stood there, with its unit.</param>
/// <param name="Message">What is wrong, as one sentence.</param>
public sealed record FormatProblem(int Line, int Column, string Field, string Value, string Expected, string Message)
{
    /// <summary>Everything in one line for logs, consoles and plain lists.</summary>
    public override string ToString()
    {
        var where = (Line, Column) switch
        {
            (0, _) => "",
            (_, 0) => $"Line {Line}: ",
            _ => $"Line {Line}, column {Column}: ",
        };
        var field = Field.Length == 0 ? "" : Field + ": ";
        var value = Value.Length == 0 ? "" : $" Found “{Value}”.";
        var expected = Expected.Length == 0 ? "" : $" Expected {Expected}.";
        return where + field + Message + value + expected;
    }
}
