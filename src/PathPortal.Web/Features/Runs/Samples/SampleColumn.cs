namespace PathPortal.Web.Features.Runs.Samples;

/// <summary>One number per sample, in the unit people read.</summary>
/// <param name="Name">How the page's scripts ask for it, such as "q0" or "track".</param>
/// <param name="At">The value at a sample; NaN where it does not apply.</param>
public sealed record SampleColumn(string Name, Func<int, double> At);
