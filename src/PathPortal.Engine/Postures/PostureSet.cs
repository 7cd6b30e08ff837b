using System.Collections.Immutable;

namespace PathPortal.Engine.Postures;

/// <summary>The postures that reach one tool pose.</summary>
/// <param name="Inside">Inside the joint position limits, whole turns of a joint counted apart; in a fixed order.</param>
/// <param name="Outside">Postures that reach the pose but pass a position limit however the joints are turned.</param>
public sealed record PostureSet(ImmutableArray<Posture> Inside, ImmutableArray<Posture> Outside)
{
    public static PostureSet Empty { get; } = new([], []);
}
