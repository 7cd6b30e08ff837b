namespace PathPortal.Formats.Documents;

/// <summary>A named pose of a cell and how it was obtained: a tool in the flange, a work frame in the cell, the base in the cell.</summary>
public sealed record MeasuredPoseDocument
{
    /// <summary>Unique among its like; empty for the base, which needs no name.</summary>
    public string Name { get; set; } = "";

    public MeasuredHow How { get; set; }

    /// <summary>Instrument, date, points touched: whatever says how good the numbers are.</summary>
    public string Detail { get; set; } = "";

    public PoseDocument Pose { get; set; } = new();

    internal MeasuredPoseDocument Copy() => this with { Pose = Pose with { Orientation = Pose.Orientation with { } } };
}
