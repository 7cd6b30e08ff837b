using System.Collections.Immutable;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Control;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;

namespace PathPortal.Engine.Stepping;

/// <summary>Writes the reference of one lane into a workspace, in base axes. Allocation-free after construction. Not safe between threads.</summary>
internal sealed unsafe class ReferenceWriter<T>
    where T : unmanaged, ILane<T>
{
    private readonly Scenario scenario;
    private readonly LoopWorkspace<T> w;
    private readonly RigidTransform X_BW;
    private readonly RotationMatrix R_WB;
    private readonly Feedforward feedforward;
    private readonly double period;

    public ReferenceWriter(Scenario scenario, LoopWorkspace<T> workspace)
    {
        (this.scenario, w) = (scenario, workspace);
        X_BW = scenario.Cell.BaseInCell.Inverse() * scenario.Cell.WorkInCell;
        R_WB = X_BW.Rotation.Transposed();
        (feedforward, period) = (scenario.Controller.Feedforward, scenario.Controller.Period);
    }

    public void Write(int lane, ReferenceCursor cursor, double time)
    {
        if (cursor.IsJointMove)
        {
            WriteJointMove(lane, cursor, time);
            return;
        }

        var now = cursor.At(time);
        var (velocity, turn) = Forward(cursor, now, time);
        SetMode(lane, false, Task(now.Place.Waypoint));
        Put(w.ForwardLinear, lane, X_BW.Rotation * velocity);
        Put(w.ForwardTurn, lane, X_BW.Rotation * turn);
        PutReference(
            lane,
            X_BW * now.Place.Position,
            X_BW.Rotation * RotationMatrix.FromQuaternion(now.Place.Orientation),
            now.Place,
            now.Velocity.Norm,
            cursor,
            time);
    }

    /// <summary>The same reference as the lane before, at the cost of a copy.</summary>
    public void CopyFromLaneBefore(int lane)
    {
        CopyEntry(w.ReferencePoint, 3, lane);
        CopyEntry(w.ReferenceRotation, 9, lane);
        CopyEntry(w.ForwardLinear, 3, lane);
        CopyEntry(w.ForwardTurn, 3, lane);
        CopyEntry(w.JointMode, 1, lane);
        CopyEntry(w.AxisTask, 1, lane);
        CopyEntry(w.TurnRows, 1, lane);
        CopyEntry(w.Echo, LoopTrace.EchoCount, lane);
    }

    // Without feedforward the path rate still has to know what the reference's next step would ask of the joints: K T v.
    private (Vector3D Linear, Vector3D Turn) Forward(ReferenceCursor cursor, ReferenceState now, double time)
    {
        switch (feedforward)
        {
            case Feedforward.Start:
                return (now.Velocity, now.TurnVelocity);
            case Feedforward.Middle:
                var middle = cursor.At(time + 0.5 * period);
                return (middle.Velocity, middle.TurnVelocity);
            case Feedforward.Difference:
                var next = cursor.At(time + period).Place;
                return (
                    1 / period * (next.Position - now.Place.Position),
                    1 / period * RotationVector.Of(next.Orientation * now.Place.Orientation.Conjugate()));
            default:
                return (
                    period * scenario.Controller.PositionGain * now.Velocity,
                    period * scenario.Controller.OrientationGain * now.TurnVelocity);
        }
    }

    private void WriteJointMove(int lane, ReferenceCursor cursor, double time)
    {
        var n = scenario.Arm.Joints.Length;
        Span<double> joints = stackalloc double[ArmModel.MaxJoints];
        Span<double> speeds = stackalloc double[ArmModel.MaxJoints];
        Span<double> next = stackalloc double[ArmModel.MaxJoints];
        cursor.JointsAt(time, joints, speeds);
        var X_BT = Tool(joints[..n]);
        var speed = ToolSpeed(joints[..n], speeds[..n], X_BT);
        switch (feedforward)
        {
            case Feedforward.Middle:
                cursor.JointsAt(time + 0.5 * period, next, speeds);
                break;
            case Feedforward.Difference:
                cursor.JointsAt(time + period, next, speeds);
                for (var i = 0; i < n; i++)
                {
                    speeds[i] = (next[i] - joints[i]) / period;
                }

                break;
            case Feedforward.None:
                for (var i = 0; i < n; i++)
                {
                    speeds[i] *= period * scenario.Controller.PositionGain;
                }

                break;
        }

        for (var i = 0; i < n; i++)
        {
            LoopWorkspace<T>.At(w.ReferenceJoints + i, lane) = joints[i];
            LoopWorkspace<T>.At(w.ReferenceJointSpeeds + i, lane) = speeds[i];
        }

        SetMode(lane, true, TaskKind.Pose);
        Put(w.ForwardLinear, lane, Vector3D.Zero);
        Put(w.ForwardTurn, lane, Vector3D.Zero);
        var R_WT = R_WB * X_BT.Rotation;
        var place = cursor.JointMoveEnd with
        {
            Position = R_WB * (X_BT.Translation - X_BW.Translation),
            Orientation = UnitQuaternion.FromMatrix(R_WT),
        };
        PutReference(lane, X_BT.Translation, X_BT.Rotation, place, speed, cursor, time);
    }

    private void PutReference(
        int lane, Vector3D point, RotationMatrix rotation, PathPoint place, double speed, ReferenceCursor cursor, double time)
    {
        Put(w.ReferencePoint, lane, point);
        for (var i = 0; i < 9; i++)
        {
            LoopWorkspace<T>.At(w.ReferenceRotation + i, lane) = rotation[i / 3, i % 3];
        }

        Put(w.Echo + LoopTrace.EchoPoint, lane, place.Position);
        Span<double> rest =
        [
            place.Orientation.W, place.Orientation.X, place.Orientation.Y, place.Orientation.Z,
            speed, time, place.Waypoint, place.Travel, cursor.Move,
        ];
        for (var i = 0; i < rest.Length; i++)
        {
            LoopWorkspace<T>.At(w.Echo + LoopTrace.EchoOrientation + i, lane) = rest[i];
        }
    }

    private void SetMode(int lane, bool jointMode, TaskKind task)
    {
        LoopWorkspace<T>.SetMask(w.JointMode, lane, jointMode);
        LoopWorkspace<T>.SetMask(w.AxisTask, lane, task == TaskKind.Axis);
        LoopWorkspace<T>.SetMask(w.TurnRows, lane, task != TaskKind.Point);
    }

    // A pause before the first segment, or after a joint move, belongs to what the tool does next or did last.
    private TaskKind Task(int waypoint)
    {
        var waypoints = scenario.Path.Waypoints;
        return waypoint > 0 ? waypoints[waypoint].Task
            : waypoints[1].Motion == MotionKind.Straight ? waypoints[1].Task : TaskKind.Pose;
    }

    private RigidTransform Tool(ReadOnlySpan<double> joints)
    {
        var X_BT = RigidTransform.Identity;
        for (var i = 0; i < joints.Length; i++)
        {
            X_BT = X_BT * scenario.Arm.Joints[i].PoseInPrevious * ArmPose.Motion(scenario.Arm.Joints[i], joints[i]);
        }

        return X_BT * scenario.Arm.FlangeInLastJoint * scenario.Cell.ToolInFlange;
    }

    // Speed of the tool centre point for joint speeds (m/s).
    private double ToolSpeed(ReadOnlySpan<double> joints, ReadOnlySpan<double> speeds, RigidTransform X_BT)
    {
        var (X_Bi, velocity) = (RigidTransform.Identity, Vector3D.Zero);
        for (var i = 0; i < joints.Length; i++)
        {
            var joint = scenario.Arm.Joints[i];
            X_Bi *= joint.PoseInPrevious;
            var axis = joint.Sign * speeds[i] * X_Bi.Rotation.AxisZ;
            velocity += joint.Kind == JointKind.Revolute ? axis.Cross(X_BT.Translation - X_Bi.Translation) : axis;
            X_Bi *= ArmPose.Motion(joint, joints[i]);
        }

        return velocity.Norm;
    }

    private static void Put(T* entry, int lane, Vector3D v)
    {
        LoopWorkspace<T>.At(entry, lane) = v.X;
        LoopWorkspace<T>.At(entry + 1, lane) = v.Y;
        LoopWorkspace<T>.At(entry + 2, lane) = v.Z;
    }

    private static void CopyEntry(T* entry, int count, int lane)
    {
        for (var i = 0; i < count; i++)
        {
            LoopWorkspace<T>.At(entry + i, lane) = LoopWorkspace<T>.At(entry + i, lane - 1);
        }
    }
}
