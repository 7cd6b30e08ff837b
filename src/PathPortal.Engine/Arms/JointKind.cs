namespace PathPortal.Engine.Arms;

/// <summary>What one joint does along or about the z axis of its own frame.</summary>
public enum JointKind
{
    /// <summary>Turns about z; the joint value is in radians.</summary>
    Revolute,

    /// <summary>Slides along z; the joint value is in metres.</summary>
    Prismatic,
}
