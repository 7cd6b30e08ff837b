using System.Collections.Immutable;
using MathNet.Numerics.LinearAlgebra;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;

namespace PathPortal.Engine.Arms;

/// <summary>
/// Ĵ = diag(I/L, I) · S · J · diag(ℓ) at one posture: the rows S a task constrains, linear rows divided by the characteristic length L, columns of
/// prismatic joints multiplied by it, so that all entries are pure numbers. For looking at one posture; the control loop has its own. Immutable.
/// </summary>
public sealed class ScaledJacobian
{
    private readonly double[] elements;

    private ScaledJacobian(double[] elements, int rows, int joints)
    {
        this.elements = elements;
        (RowCount, JointCount) = (rows, joints);
        var matrix = Matrix<double>.Build.Dense(rows, joints, (row, joint) => elements[row * joints + joint]);
        SingularValues = [.. matrix.Svd(computeVectors: false).S];
    }

    /// <summary>6 for a pose, 5 for an axis task (angular rows along x and y of the tool), 3 for a point.</summary>
    public int RowCount { get; }

    public int JointCount { get; }

    /// <summary>Singular values, largest first, as many as the smaller of rows and joints.</summary>
    public ImmutableArray<double> SingularValues { get; }

    /// <summary>σ_max / σ_min; +∞ where σ_min is zero.</summary>
    public double Condition => SingularValues[0] / SingularValues[^1];

    /// <summary>√det(ĴĴᵀ), the product of the singular values (Yoshikawa 1985); zero for fewer joints than rows.</summary>
    public double Manipulability => JointCount < RowCount ? 0 : SingularValues.Aggregate(1.0, (product, sigma) => product * sigma);

    /// <summary>The element in a row and the column of a joint, both from 0.</summary>
    public double this[int row, int joint] => elements[row * JointCount + joint];

    /// <summary>At controller's joint values (rad or m), for a tool X_FT.</summary>
    public static ScaledJacobian Compute(
        ArmModel arm, ReadOnlySpan<double> joints, RigidTransform toolInFlange, TaskKind task = TaskKind.Pose)
    {
        var pose = ArmPose.Compute(arm, joints);
        var tool = pose.Tool(toolInFlange);
        var rows = TaskRows.RowCount(task);
        var elements = new double[rows * joints.Length];
        TaskRows.WriteJacobian(task, GeometricJacobian.Compute(arm, pose, tool.Translation), tool.Rotation, elements);
        TaskRows.ScaleJacobian(arm, elements);
        return new(elements, rows, joints.Length);
    }
}
