namespace PathPortal.Engine.Arms;

/// <summary>One limit of a joint and where the number comes from.</summary>
/// <param name="Value">SI: rad or m, and their first to third derivatives by time.</param>
/// <param name="Source">Where the number was read, for example "data sheet, table 3" or "invented".</param>
public readonly record struct Limit(double Value, string Source);
