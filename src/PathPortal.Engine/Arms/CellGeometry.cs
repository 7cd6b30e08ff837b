using PathPortal.Engine.Geometry;

namespace PathPortal.Engine.Arms;

/// <summary>Where the arm stands and what it carries, for one tool and one work frame. The tool is on the arm, the part in the cell.</summary>
/// <param name="BaseInCell">X_CB.</param>
/// <param name="ToolInFlange">X_FT. The tool axis is the z axis of T.</param>
/// <param name="WorkInCell">X_CW: the frame in which path points are written.</param>
public sealed record CellGeometry(RigidTransform BaseInCell, RigidTransform ToolInFlange, RigidTransform WorkInCell);
