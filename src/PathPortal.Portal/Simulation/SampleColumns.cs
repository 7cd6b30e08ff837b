using PathPortal.Engine;

namespace PathPortal.Portal.Simulation;

/// <summary>The columns of a run's samples in one fixed order: for their size, and for keeping them.</summary>
internal static class SampleColumns
{
    /// <summary>Columns of numbers before those of limit use.</summary>
    public static IEnumerable<double[]> Numbers(RunSamples samples) =>
    [
        samples.ReferenceTime, samples.PathFraction,
        .. samples.Joints, .. samples.JointSpeeds, .. samples.JointSpeedDemands, .. samples.JointAccelerationDemands,
        .. samples.ReferencePosition, .. samples.ReferenceOrientation, .. samples.ToolPosition, .. samples.ToolOrientation,
        samples.TrackingError, samples.TurnError, samples.AcrossPath, samples.StandOff, samples.ToolAxisAngle,
        samples.ToolSpeed, samples.ReferenceSpeed, samples.SigmaMin, samples.SigmaMax,
        samples.DampingSquared, samples.SpeedScale, samples.PathScale,
    ];

    /// <summary>Bytes of all columns in memory.</summary>
    public static long Size(RunSamples samples) =>
        ((long)samples.Count * (sizeof(int) + sizeof(bool)))
        + ((Numbers(samples).Count() + samples.Use.Count) * (long)samples.Count * sizeof(double));
}
