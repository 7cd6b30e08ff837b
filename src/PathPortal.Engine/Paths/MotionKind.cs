namespace PathPortal.Engine.Paths;

/// <summary>How the tool gets from the waypoint before to this one.</summary>
public enum MotionKind
{
    /// <summary>The tool centre point runs straight; orientation turns about one axis at a steady share of the way (SLERP).</summary>
    Straight,

    /// <summary>All joints start and stop together; the tool path in between is whatever the arm makes of it. For moves in air.</summary>
    Joint,
}
