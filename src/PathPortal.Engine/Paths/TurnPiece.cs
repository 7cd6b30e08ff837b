using PathPortal.Engine.Control;
using PathPortal.Engine.Geometry;

namespace PathPortal.Engine.Paths;

/// <summary>A turn on the spot; its length is its angle (rad).</summary>
internal sealed class TurnPiece(Segment segment, ControllerSettings controller) : ChainPiece
{
    public override double Length => segment.TurnAngle;

    public override Stretch Stretch => new(Length, controller.ToolTurnSpeed, controller.ToolTurnAcceleration);

    public override PathPoint At(double s) => new(
        segment.Start, segment.OrientationAt(s / Length), Vector3D.Zero, 1 / Length * segment.Turn, segment.Waypoint, segment.EndTravel);
}
