namespace PathPortal.Engine.Control;

/// <summary>How joint speed demands beyond a limit are cut.</summary>
public enum SpeedLimiter
{
    /// <summary>All joints by one factor: the tool keeps its direction.</summary>
    CommonScaling,

    /// <summary>Each joint at its own limit: the tool may leave its direction.</summary>
    PerJoint,
}
