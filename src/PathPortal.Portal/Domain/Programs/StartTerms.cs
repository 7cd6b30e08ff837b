namespace PathPortal.Portal.Domain.Programs;

/// <summary>How a program runs on a cell: which of the setup's tools and frames, and how it starts.</summary>
/// <param name="ToolName">A tool named in the cell's setup.</param>
/// <param name="WorkFrameName">A work frame named in the cell's setup.</param>
/// <param name="StartJoints">Joint values at the first point (rad or m); null: every posture is tried and the best one chosen.</param>
/// <param name="FreeTurn">Turn about the free tool axis at the first point (rad); null: a grid is tried.</param>
public sealed record StartTerms(string ToolName, string WorkFrameName, double[]? StartJoints, double? FreeTurn);
