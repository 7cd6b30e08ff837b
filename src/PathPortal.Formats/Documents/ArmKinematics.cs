namespace PathPortal.Formats.Documents;

/// <summary>How the rows of an arm document describe its chain.</summary>
public enum ArmKinematics
{
    /// <summary>Denavit–Hartenberg, distal frames: T = Rot z(θ) Trans z(d) Trans x(a) Rot x(α) per joint (Denavit and Hartenberg 1955).</summary>
    DhStandard,

    /// <summary>
    /// Denavit–Hartenberg, proximal frames: T = Rot x(α) Trans x(a) Rot z(θ) Trans z(d) per joint, a and α of the link before (Craig, Introduction to
    /// Robotics). The chain ends at the last joint; what follows belongs into the flange pose.
    /// </summary>
    DhModified,

    /// <summary>Per joint a pose in the link before and an axis in that frame, as URDF files give them; motion is about or along the axis.</summary>
    JointFrames,
}
