using System.Collections.Immutable;

namespace PathPortal.Engine.Postures;

/// <summary>One way for the arm to reach a tool pose.</summary>
/// <param name="Joints">Controller's joint values (rad or m).</param>
/// <param name="Description">In words, such as "shoulder front, elbow up, wrist not flipped".</param>
public sealed record Posture(ImmutableArray<double> Joints, string Description);
