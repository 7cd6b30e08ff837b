namespace PathPortal.Engine.Verdicts;

/// <summary>A stretch of a run where one criterion is near or over its limit.</summary>
/// <param name="Over">True where use passes 100 % inside the stretch; false where it only comes near.</param>
/// <param name="WorstUse">Largest use inside, positive infinity as in <see cref="CriterionOutcome.WorstUse"/>.</param>
/// <param name="Joint">Joint (from 0) of the worst sample, for criteria about joints.</param>
public sealed record Finding(
    Criterion Criterion, bool Over, bool Binding, Place From, Place To, Place Worst, double WorstUse, int? Joint);
