using PathPortal.Engine.Geometry;

namespace PathPortal.Engine.Arms;

/// <summary>
/// The 6×n geometric Jacobian: tool twist = J q̇. Rows 0..2 linear velocity of the tool centre point (m), rows 3..5 angular velocity, both in
/// base axes; column i belongs to the controller's value of joint i, its sign included (Siciliano et al. 2009, eq. 3.30). Immutable.
/// </summary>
public sealed class GeometricJacobian
{
    private readonly double[] elements;

    private GeometricJacobian(double[] elements, int joints) => (this.elements, JointCount) = (elements, joints);

    public int JointCount { get; }

    /// <summary>The element in a row 0..5 and the column of a joint from 0.</summary>
    public double this[int row, int joint] => elements[row * JointCount + joint];

    /// <summary>The Jacobian of an arm whose tool centre point is at <paramref name="toolPoint"/> (m, base axes).</summary>
    public static GeometricJacobian Compute(ArmModel arm, ArmPose pose, Vector3D toolPoint)
    {
        ArgumentNullException.ThrowIfNull(arm);
        ArgumentNullException.ThrowIfNull(pose);
        var n = arm.Joints.Length;
        var elements = new double[6 * n];
        for (var i = 0; i < n; i++)
        {
            var axis = arm.Joints[i].Sign * pose.JointFrames[i].Rotation.AxisZ;
            var column = arm.Joints[i].Kind == JointKind.Revolute
                ? new Twist(axis.Cross(toolPoint - pose.JointFrames[i].Translation), axis)
                : new Twist(axis, Vector3D.Zero);
            elements[i] = column.Linear.X;
            elements[n + i] = column.Linear.Y;
            elements[2 * n + i] = column.Linear.Z;
            elements[3 * n + i] = column.Angular.X;
            elements[4 * n + i] = column.Angular.Y;
            elements[5 * n + i] = column.Angular.Z;
        }

        return new(elements, n);
    }

    /// <summary>The Jacobian at the tool centre point of a tool X_FT for controller's joint values.</summary>
    public static GeometricJacobian Compute(ArmModel arm, ReadOnlySpan<double> joints, RigidTransform toolInFlange)
    {
        var pose = ArmPose.Compute(arm, joints);
        return Compute(arm, pose, pose.Tool(toolInFlange).Translation);
    }

    /// <summary>The twist of the tool for joint speeds (rad/s or m/s).</summary>
    public Twist Times(ReadOnlySpan<double> jointSpeeds)
    {
        if (jointSpeeds.Length != JointCount)
        {
            throw new ArgumentException($"The Jacobian has {JointCount} columns, but {jointSpeeds.Length} speeds are given.", nameof(jointSpeeds));
        }

        Span<double> rows = stackalloc double[6];
        for (var row = 0; row < 6; row++)
        {
            for (var i = 0; i < JointCount; i++)
            {
                rows[row] += this[row, i] * jointSpeeds[i];
            }
        }

        return new(new(rows[0], rows[1], rows[2]), new(rows[3], rows[4], rows[5]));
    }
}
