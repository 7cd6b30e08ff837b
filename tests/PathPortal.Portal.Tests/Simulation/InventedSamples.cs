using PathPortal.Engine;
using PathPortal.Engine.Verdicts;

namespace PathPortal.Portal.Tests.Simulation;

/// <summary>Samples of an invented run: smooth columns, and every value that is awkward to store.</summary>
internal static class InventedSamples
{
    public static RunSamples Of(int count, int joints = 6)
    {
        double[] Column(double phase) => [.. Enumerable.Range(0, count).Select(k => Math.Sin((k * 0.001) + phase))];
        double[][] Columns(int columns, double phase) => [.. Enumerable.Range(0, columns).Select(c => Column(phase + c))];
        double[] awkward = [double.NaN, double.PositiveInfinity, -0.0, double.Epsilon, double.MaxValue, BitConverter.Int64BitsToDouble(0x7FF8_0000_0000_0001)];
        return new()
        {
            Count = count,
            JointCount = joints,
            Period = 0.004,
            ReferenceTime = Column(0),
            PathFraction = Column(1),
            Waypoint = [.. Enumerable.Range(0, count).Select(k => k / 7)],
            Process = [.. Enumerable.Range(0, count).Select(k => k % 3 == 0)],
            Joints = Columns(joints, 2),
            JointSpeeds = Columns(joints, 3),
            JointSpeedDemands = Columns(joints, 4),
            JointAccelerationDemands = Columns(joints, 5),
            ReferencePosition = Columns(3, 6),
            ReferenceOrientation = Columns(4, 7),
            ToolPosition = Columns(3, 8),
            ToolOrientation = Columns(4, 9),
            TrackingError = Column(10),
            TurnError = Column(11),
            AcrossPath = [.. Enumerable.Range(0, count).Select(k => awkward[k % awkward.Length])],
            StandOff = Column(12),
            ToolAxisAngle = Column(13),
            ToolSpeed = Column(14),
            ReferenceSpeed = Column(15),
            SigmaMin = Column(16),
            SigmaMax = Column(17),
            DampingSquared = Column(18),
            SpeedScale = Column(19),
            PathScale = Column(20),
            Use = new Dictionary<Criterion, double[]> { [Criterion.JointSpeed] = Column(21), [Criterion.AcrossPath] = Column(22) },
        };
    }
}
