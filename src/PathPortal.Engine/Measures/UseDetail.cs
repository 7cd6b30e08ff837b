namespace PathPortal.Engine.Measures;

/// <summary>What stands behind the use of a limit at one sample, SI.</summary>
/// <param name="Joint">Joint (from 0), where the criterion is about joints.</param>
/// <param name="Value">The measured value.</param>
/// <param name="Limit">What it is compared with, after shares and allowances.</param>
internal readonly record struct UseDetail(int? Joint, double Value, double Limit, string Unit);
