namespace PathPortal.Engine.Paths;

/// <summary>Which directions of the tool pose the process constrains.</summary>
public enum TaskKind
{
    /// <summary>All six.</summary>
    Pose,

    /// <summary>Five: position and the direction of the tool axis; the turn about it is free (drilling, dispensing, milling).</summary>
    Axis,

    /// <summary>Three: the tool centre point only (a ball-shaped polishing tool).</summary>
    Point,
}
