using System.Collections.Immutable;

namespace PathPortal.Engine.Postures;

/// <summary>One start of a run: a posture of the first waypoint.</summary>
/// <param name="Joints">Controller's joint values (rad or m).</param>
/// <param name="Description">In words.</param>
/// <param name="FreeTurn">Turn about the tool axis added to the first waypoint's programmed orientation (rad).</param>
public sealed record StartPosture(ImmutableArray<double> Joints, string Description, double FreeTurn);
