namespace PathPortal.Engine.Verdicts;

/// <summary>One place on a run.</summary>
/// <param name="Sample">Index of the sample, from 0.</param>
/// <param name="Time">Time since the start (s).</param>
/// <param name="PathFraction">Share of the programmed tool travel passed, 0..1.</param>
/// <param name="Waypoint">Index (from 0) of the waypoint the tool is on its way to.</param>
public readonly record struct Place(int Sample, double Time, double PathFraction, int Waypoint);
