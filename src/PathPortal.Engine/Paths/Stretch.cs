namespace PathPortal.Engine.Paths;

/// <summary>A part of a chain with one bound on speed and one on acceleration.</summary>
/// <param name="Length">Along the chain (m, or rad on a turn on the spot), above zero.</param>
/// <param name="Speed">Highest ds/dt, above zero.</param>
/// <param name="Acceleration">Highest |d²s/dt²|, above zero.</param>
internal readonly record struct Stretch(double Length, double Speed, double Acceleration);
