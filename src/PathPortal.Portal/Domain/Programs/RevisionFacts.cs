namespace PathPortal.Portal.Domain.Programs;

/// <summary>What the reader found in a file, for lists. SI; the box is in the work frame.</summary>
/// <param name="PlannedTime">Time the path needs on its own, where the reader could tell (s).</param>
/// <param name="BoxLow">Smallest x, y, z of the points (m).</param>
/// <param name="BoxHigh">Largest x, y, z of the points (m).</param>
public sealed record RevisionFacts(
    int PointCount, double Length, double? PlannedTime, double[] BoxLow, double[] BoxHigh, IReadOnlyList<string> Remarks);
