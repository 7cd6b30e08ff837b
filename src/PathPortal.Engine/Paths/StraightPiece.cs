using PathPortal.Engine.Control;

namespace PathPortal.Engine.Paths;

/// <summary>The part of a straight segment that its corners leave, from one distance along the segment to another (m).</summary>
internal sealed class StraightPiece(Segment segment, double from, double to, ControllerSettings controller) : ChainPiece
{
    public override double Length => to - from;

    // Turning along the way may need the tool to go slower than programmed, and to speed up more gently.
    public override Stretch Stretch => new(
        Length,
        Math.Min(segment.Speed, controller.ToolTurnSpeed / segment.TurnPerLength),
        Math.Min(controller.ToolAcceleration, controller.ToolTurnAcceleration / segment.TurnPerLength));

    public override PathPoint At(double s) => segment.At(from + s);
}
