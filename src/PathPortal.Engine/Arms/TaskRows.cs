using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;

namespace PathPortal.Engine.Arms;

/// <summary>
/// The rows of a tool pose that a task constrains: how far a posture is from a goal, and the Jacobian of exactly those rows. Linear rows in base
/// axes; angular rows in base axes for a pose, x and y of the tool frame for an axis task.
/// </summary>
internal static class TaskRows
{
    public static int RowCount(TaskKind task) => task switch
    {
        TaskKind.Pose => 6,
        TaskKind.Axis => 5,
        TaskKind.Point => 3,
        _ => throw new ArgumentOutOfRangeException(nameof(task), task, "Not a task."),
    };

    /// <summary>
    /// Writes goal ⊖ tool (m, rad) into the task's rows: the rotation vector of R_G R_Tᵀ, or for an axis task the swing that takes the tool axis to
    /// the goal's, which is not the same as that vector without a row.
    /// </summary>
    public static void Write(TaskKind task, RigidTransform tool, RigidTransform goal, Span<double> rows)
    {
        var linear = goal.Translation - tool.Translation;
        (rows[0], rows[1], rows[2]) = (linear.X, linear.Y, linear.Z);
        if (task == TaskKind.Pose)
        {
            var turn = RotationVector.Of(goal.Rotation * tool.Rotation.Transposed());
            (rows[3], rows[4], rows[5]) = (turn.X, turn.Y, turn.Z);
        }
        else if (task == TaskKind.Axis)
        {
            var swing = RotationVector.Of(ToolAxisFrame.ShortestTurn(tool.Rotation.AxisZ, goal.Rotation.AxisZ));
            (rows[3], rows[4]) = (swing.Dot(tool.Rotation.AxisX), swing.Dot(tool.Rotation.AxisY));
        }
    }

    /// <summary>Writes the task's rows of the Jacobian, row-major rows × joints.</summary>
    public static void WriteJacobian(TaskKind task, GeometricJacobian J, RotationMatrix R_BT, Span<double> rows)
    {
        var n = J.JointCount;
        for (var i = 0; i < n; i++)
        {
            (rows[i], rows[n + i], rows[2 * n + i]) = (J[0, i], J[1, i], J[2, i]);
            var angular = new Vector3D(J[3, i], J[4, i], J[5, i]);
            if (task == TaskKind.Pose)
            {
                (rows[3 * n + i], rows[4 * n + i], rows[5 * n + i]) = (angular.X, angular.Y, angular.Z);
            }
            else if (task == TaskKind.Axis)
            {
                (rows[3 * n + i], rows[4 * n + i]) = (angular.Dot(R_BT.AxisX), angular.Dot(R_BT.AxisY));
            }
        }
    }

    /// <summary>Scales rows of <see cref="WriteJacobian"/> in place: diag(I/L, I) J diag(ℓ), ℓ = L for prismatic joints.</summary>
    public static void ScaleJacobian(ArmModel arm, Span<double> rows)
    {
        var (n, L) = (arm.Joints.Length, arm.CharacteristicLength);
        for (var i = 0; i < rows.Length; i++)
        {
            rows[i] *= (i / n < 3 ? 1 / L : 1) * (arm.Joints[i % n].Kind == JointKind.Prismatic ? L : 1);
        }
    }

    /// <summary>Scales a written error in place: linear rows divided by L.</summary>
    public static void ScaleError(ArmModel arm, Span<double> rows)
    {
        for (var row = 0; row < 3; row++)
        {
            rows[row] /= arm.CharacteristicLength;
        }
    }
}
