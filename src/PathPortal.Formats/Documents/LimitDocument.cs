namespace PathPortal.Formats.Documents;

/// <summary>One limit and where the number was read.</summary>
public sealed record LimitDocument
{
    /// <summary>Degrees for revolute joints, millimetres for prismatic ones, and their first to third derivatives by seconds.</summary>
    public double Value { get; set; }

    /// <summary>For example “data sheet, table 3” or “invented”.</summary>
    public string Source { get; set; } = "";
}
