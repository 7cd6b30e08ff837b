using System.Collections.Immutable;

namespace PathPortal.Engine.Verdicts;

/// <summary>One start posture that was simulated, and how it did.</summary>
/// <param name="Joints">Joint values of the first waypoint (rad or m).</param>
/// <param name="Description">In words, such as "shoulder front, elbow up, wrist not flipped", or "start 3 of 8" for arms without closed form.</param>
/// <param name="WorstUse">Worst use over the binding criteria.</param>
/// <param name="WorstCriterion">The criterion of that use; null when nothing could be judged.</param>
/// <param name="Chosen">True for the one posture the run's results stand on.</param>
public sealed record PostureOutcome(
    ImmutableArray<double> Joints, string Description, Verdict Verdict, double WorstUse, Criterion? WorstCriterion, bool Chosen);
