namespace PathPortal.Web.Features.Runs;

/// <summary>A constant a chart's lines are compared with, in the chart's unit.</summary>
public sealed record LaneLimit(double Value, string Label);
