using PathPortal.Engine.Control;

namespace PathPortal.Engine.Stepping;

/// <summary>How one lane's simulation ended.</summary>
/// <param name="Count">Samples, the last one included.</param>
/// <param name="Reason">One sentence where the end is not <see cref="RunEnd.Completed"/>.</param>
/// <param name="PlannedTime">When the reference would have ended at full rate, as far as it got (s).</param>
internal readonly record struct LaneOutcome(RunEnd End, int Count, string? Reason, double PlannedTime);
