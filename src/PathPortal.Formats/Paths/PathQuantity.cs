namespace PathPortal.Formats.Paths;

/// <summary>What a column of a path file holds.</summary>
internal enum PathQuantity
{
    Position,
    Quaternion,
    Angles,
    AxisToTip,
    AxisToHolder,
    Motion,
    Posture,
    Speed,
    JointSpeed,
    Corner,
    Process,
    LeadIn,
    Task,
    Dwell,
    Label,
}
