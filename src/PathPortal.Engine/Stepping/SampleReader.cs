using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;

namespace PathPortal.Engine.Stepping;

/// <summary>Makes the samples of one lane from its trace: poses in the work frame, place along the path, deviation from the programmed geometry.</summary>
internal sealed class SampleReader
{
    private readonly Scenario scenario;
    private readonly PathPlan plan;
    private readonly LoopTrace trace;
    private readonly int lane;
    private readonly int count;
    private readonly RunSamples samples;
    private readonly double[] referenceTravel;

    private SampleReader(Scenario scenario, PathPlan plan, LoopTrace trace, int lane, int count)
    {
        (this.scenario, this.plan, this.trace, this.lane, this.count) = (scenario, plan, trace, lane, count);
        var n = scenario.Arm.Joints.Length;
        referenceTravel = Column(trace.Echo + LoopTrace.EchoTravel);
        samples = new()
        {
            Count = count,
            JointCount = n,
            Period = scenario.Controller.Period,
            ReferenceTime = Column(trace.Echo + LoopTrace.EchoTime),
            PathFraction = new double[count],
            Waypoint = Array.ConvertAll(Column(trace.Echo + LoopTrace.EchoWaypoint), w => (int)w),
            Process = new bool[count],
            Joints = Columns(LoopTrace.Joints, n),
            JointSpeeds = Columns(trace.Speeds, n),
            JointSpeedDemands = Columns(trace.Demands, n),
            JointAccelerationDemands = Columns(trace.AccelerationDemands, n),
            ReferencePosition = Columns(trace.Echo + LoopTrace.EchoPoint, 3),
            ReferenceOrientation = Columns(trace.Echo + LoopTrace.EchoOrientation, 4),
            ToolPosition = [new double[count], new double[count], new double[count]],
            ToolOrientation = [new double[count], new double[count], new double[count], new double[count]],
            TrackingError = Column(trace.Distance),
            TurnError = Column(trace.Turn),
            AcrossPath = Absent(),
            StandOff = Absent(),
            ToolAxisAngle = Absent(),
            ToolSpeed = Column(trace.ToolSpeed),
            ReferenceSpeed = Column(trace.Echo + LoopTrace.EchoSpeed),
            SigmaMin = Column(trace.SigmaMin),
            SigmaMax = Column(trace.SigmaMax),
            DampingSquared = Column(trace.DampingSquared),
            SpeedScale = Column(trace.SpeedScale),
            PathScale = Column(trace.PathRate),
        };
    }

    /// <summary>The first <paramref name="count"/> samples of a lane, and the tool travel of the whole path as this arm makes it (m).</summary>
    public static (RunSamples Samples, double Length) Read(Scenario scenario, PathPlan plan, LoopTrace trace, int lane, int count)
    {
        var reader = new SampleReader(scenario, plan, trace, lane, count);
        reader.ReadToolPoses();
        return (reader.samples, reader.FollowPath());
    }

    private void ReadToolPoses()
    {
        var X_WB = scenario.Cell.WorkInCell.Inverse() * scenario.Cell.BaseInCell;
        var point = Columns(trace.ToolPoint, 3);
        var R = Columns(trace.ToolRotation, 9);
        for (var k = 0; k < count; k++)
        {
            var p = X_WB * new Vector3D(point[0][k], point[1][k], point[2][k]);
            var R_WT = X_WB.Rotation
                * new RotationMatrix(R[0][k], R[1][k], R[2][k], R[3][k], R[4][k], R[5][k], R[6][k], R[7][k], R[8][k]);
            (samples.ToolPosition[0][k], samples.ToolPosition[1][k], samples.ToolPosition[2][k]) = (p.X, p.Y, p.Z);
            var (w, x, y, z) = Components(R_WT, k);
            (samples.ToolOrientation[0][k], samples.ToolOrientation[1][k]) = (w, x);
            (samples.ToolOrientation[2][k], samples.ToolOrientation[3][k]) = (y, z);
        }
    }

    // The sign nearest to the sample before, so that the four columns run on smoothly. A pose that is not finite has no quaternion.
    private (double W, double X, double Y, double Z) Components(RotationMatrix rotation, int k)
    {
        if (!double.IsFinite(rotation.R11 + rotation.R22 + rotation.R33 + rotation.R12 + rotation.R23 + rotation.R31))
        {
            return (double.NaN, double.NaN, double.NaN, double.NaN);
        }

        var q = UnitQuaternion.FromMatrix(rotation);
        var before = samples.ToolOrientation;
        var dot = k == 0
            ? q.W
            : before[0][k - 1] * q.W + before[1][k - 1] * q.X + before[2][k - 1] * q.Y + before[3][k - 1] * q.Z;
        return dot < 0 ? (-q.W, -q.X, -q.Y, -q.Z) : (q.W, q.X, q.Y, q.Z);
    }

    // Travel on tool-space moves is what the tool has passed of the programmed geometry; on joint moves what the reference's tool has travelled.
    private double FollowPath()
    {
        var sections = ProcessSections.Of(scenario.Path, plan.Segments);
        var track = new ProgrammedTrack(plan.Segments);
        var travel = new double[count];
        var (byJoints, inTool) = (0.0, false);
        for (var k = 0; k < count; k++)
        {
            if (plan.Segments[samples.Waypoint[k]] is null && !IsDwellBeforeSegment(k))
            {
                byJoints += k == 0 ? 0 : ReferenceStep(k);
                travel[k] = byJoints + referenceTravel[k];
                inTool = false;
                continue;
            }

            if (!inTool)
            {
                track.Begin(Math.Max(1, samples.Waypoint[k]));
                inTool = true;
            }

            Follow(track, sections, k);
            travel[k] = byJoints + track.Travel;
        }

        var length = plan.Length + byJoints + JointMovesNotMade();
        var passed = 0.0;
        for (var k = 0; k < count; k++)
        {
            passed = Math.Max(passed, length > 0 ? Math.Min(1, travel[k] / length) : 1);
            samples.PathFraction[k] = passed;
        }

        return length;
    }

    private void Follow(ProgrammedTrack track, ProcessSections sections, int k)
    {
        var ahead = Math.Min(k + scenario.Controller.MeasurementDelay, count - 1);
        while (ahead > k && plan.Segments[samples.Waypoint[ahead]] is null)
        {
            ahead--;
        }

        var isLast = k + 1 == count || plan.Segments[samples.Waypoint[k + 1]] is null;
        var point = new Vector3D(samples.ToolPosition[0][k], samples.ToolPosition[1][k], samples.ToolPosition[2][k]);
        var deviation = track.MoveTo(
            point, ToolAxis(k), Math.Max(1, samples.Waypoint[ahead]), referenceTravel[ahead], isLast);
        samples.Process[k] = sections.IsOn(track.Waypoint, track.Travel);
        if (samples.Process[k])
        {
            (samples.AcrossPath[k], samples.StandOff[k], samples.ToolAxisAngle[k]) = (deviation.Across, deviation.StandOff, deviation.Axis);
        }
    }

    private Vector3D ToolAxis(int k)
    {
        var q = samples.ToolOrientation;
        var (w, x, y, z) = (q[0][k], q[1][k], q[2][k], q[3][k]);
        return new(2 * (x * z + w * y), 2 * (y * z - w * x), 1 - 2 * (x * x + y * y));
    }

    // A pause before the first segment stands at waypoint 0, which no segment ends at.
    private bool IsDwellBeforeSegment(int k) => samples.Waypoint[k] == 0 && plan.Segments.Length > 1 && plan.Segments[1] is not null;

    private double ReferenceStep(int k)
    {
        var p = samples.ReferencePosition;
        return new Vector3D(p[0][k] - p[0][k - 1], p[1][k] - p[1][k - 1], p[2][k] - p[2][k - 1]).Norm;
    }

    // A run that ended early knows the rest of its joint moves only by the straight distance between their ends.
    private double JointMovesNotMade()
    {
        var sum = 0.0;
        for (var i = count == 0 ? 1 : samples.Waypoint[count - 1] + 1; i < plan.Segments.Length; i++)
        {
            sum += plan.Segments[i] is null ? (scenario.Path.Waypoints[i].Position - scenario.Path.Waypoints[i - 1].Position).Norm : 0;
        }

        return sum;
    }

    private double[] Column(int channel)
    {
        var column = new double[count];
        trace.Copy(channel, lane, column);
        return column;
    }

    private double[][] Columns(int channel, int number) => [.. Enumerable.Range(channel, number).Select(Column)];

    private double[] Absent()
    {
        var column = new double[count];
        Array.Fill(column, double.NaN);
        return column;
    }
}
