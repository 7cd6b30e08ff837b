using System.Collections.Immutable;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Control;
using PathPortal.Engine.Geometry;

namespace PathPortal.Engine.Stepping;

/// <summary>The constants of one arm, tool and controller in the form the kernel reads. Immutable.</summary>
internal sealed class LoopSetup
{
    /// <summary>Condition number beyond which an undamped inverse is no longer followed.</summary>
    public const double LargestCondition = 1e7;

    public LoopSetup(ArmModel arm, RigidTransform toolInFlange, ControllerSettings controller)
    {
        Controller = controller;
        JointCount = arm.Joints.Length;
        Length = arm.CharacteristicLength;
        LinkPoses = [.. arm.Joints.SelectMany(j => Numbers(j.PoseInPrevious))];
        ToolInLastJoint = [.. Numbers(arm.FlangeInLastJoint * toolInFlange)];
        Prismatic = [.. arm.Joints.Select(j => j.Kind == JointKind.Prismatic)];
        Sign = [.. arm.Joints.Select(j => (double)j.Sign)];
        Zero = [.. arm.Joints.Select(j => j.Zero)];
        SpeedLimit = [.. arm.Joints.Select(j => j.Limits.Speed?.Value ?? double.PositiveInfinity)];
        AccelerationLimit = [.. arm.Joints.Select(j => j.Limits.Acceleration?.Value ?? double.PositiveInfinity)];
        Middle = [.. arm.Joints.Select(j => j.Limits is { Low: { } low, High: { } high } ? 0.5 * (low.Value + high.Value) : double.NaN)];

        var tau = controller.ServoTimeConstant;
        ServoDecay = tau > 0 ? Deterministic.Exp(-controller.Period / tau) : 0;
    }

    public ControllerSettings Controller { get; }

    public int JointCount { get; }

    /// <summary>Characteristic length L (m).</summary>
    public double Length { get; }

    /// <summary>A_i, twelve numbers a joint: rotation by rows, then translation (m).</summary>
    public double[] LinkPoses { get; }

    /// <summary>X_NT, twelve numbers as in <see cref="LinkPoses"/>.</summary>
    public double[] ToolInLastJoint { get; }

    public bool[] Prismatic { get; }

    public double[] Sign { get; }

    public double[] Zero { get; }

    /// <summary>rad/s or m/s; infinite where not given.</summary>
    public double[] SpeedLimit { get; }

    /// <summary>rad/s² or m/s²; infinite where not given.</summary>
    public double[] AccelerationLimit { get; }

    /// <summary>Middle of the position range; NaN for a joint without one.</summary>
    public double[] Middle { get; }

    /// <summary>p = exp(−T/τ), 0 for an ideal integrator.</summary>
    public double ServoDecay { get; }

    private static IEnumerable<double> Numbers(RigidTransform x) =>
    [
        x.Rotation.R11, x.Rotation.R12, x.Rotation.R13, x.Rotation.R21, x.Rotation.R22, x.Rotation.R23,
        x.Rotation.R31, x.Rotation.R32, x.Rotation.R33, x.Translation.X, x.Translation.Y, x.Translation.Z,
    ];
}
