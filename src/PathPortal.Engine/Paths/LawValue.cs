namespace PathPortal.Engine.Paths;

/// <summary>A time law at one instant: value and its first two derivatives, in the units of the law that made it.</summary>
public readonly record struct LawValue(double Value, double First, double Second);
