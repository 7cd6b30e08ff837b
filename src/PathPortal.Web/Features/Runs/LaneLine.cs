namespace PathPortal.Web.Features.Runs;

/// <summary>One line of a chart.</summary>
/// <param name="Column">The sample column it shows.</param>
/// <param name="Hue">Which of the line colours, from 0.</param>
public sealed record LaneLine(string Column, string Label, int Hue);
