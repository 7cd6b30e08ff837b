using PathPortal.Engine.Arms;

namespace PathPortal.Formats.Documents;

/// <summary>One joint of an arm document. Which geometry counts is decided by <see cref="ArmDocument.Kinematics"/>.</summary>
public sealed record JointDocument
{
    public string Name { get; set; } = "";

    public JointKind Kind { get; set; }

    /// <summary>+1 or −1: sense of the controller's joint value.</summary>
    public int Sign { get; set; } = 1;

    /// <summary>θ of the row, constant; the motion of a revolute joint, sign · value, adds to it.</summary>
    public double ThetaDeg { get; set; }

    /// <summary>d of the row, constant; the motion of a prismatic joint, sign · value, adds to it.</summary>
    public double DMm { get; set; }

    /// <summary>a of the row; with modified rows that of the link before.</summary>
    public double AMm { get; set; }

    /// <summary>α of the row; with modified rows that of the link before.</summary>
    public double AlphaDeg { get; set; }

    /// <summary>With joint frames: this joint's frame in the link before (in the base for the first).</summary>
    public PoseDocument Pose { get; set; } = new();

    /// <summary>With joint frames: the axis in this joint's frame; any length but zero.</summary>
    public double AxisX { get; set; }

    public double AxisY { get; set; }

    public double AxisZ { get; set; } = 1;

    /// <summary>With joint frames: added to sign · value (degrees or millimetres by kind).</summary>
    public double Zero { get; set; }

    public JointLimitsDocument Limits { get; set; } = new();
}
