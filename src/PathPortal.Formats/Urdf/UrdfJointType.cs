namespace PathPortal.Formats.Urdf;

/// <summary>Joint types of the URDF specification.</summary>
internal enum UrdfJointType
{
    Fixed,
    Revolute,
    Continuous,
    Prismatic,
    Floating,
    Planar,
}
