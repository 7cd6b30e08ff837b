using PathPortal.Engine.Control;
using PathPortal.Engine.Geometry;

namespace PathPortal.Engine.Paths;

/// <summary>
/// A rounded corner between two straight segments. Orientation goes as position does: with share u the turn still missing before the corner is
/// (1 − u)² of the reach's, the turn made after it u², so that it too leaves and joins the straights without a jump in rate.
/// </summary>
internal sealed class CornerPiece : ChainPiece
{
    private readonly Segment before;
    private readonly Segment after;
    private readonly double reach;
    private readonly RoundedCorner corner;
    private readonly Vector3D turnBefore;
    private readonly Vector3D turnAfter;
    private readonly ControllerSettings controller;

    public CornerPiece(Segment before, Segment after, double reach, ControllerSettings controller)
    {
        (this.before, this.after, this.reach, this.controller) = (before, after, reach, controller);
        corner = new(before.End, before.Direction, after.Direction, reach);
        turnBefore = reach / before.Length * before.Turn;
        turnAfter = reach / after.Length * after.Turn;
    }

    public override double Length => 2 * corner.HalfLength;

    // The slower programmed speed; v²/ρ within the tool acceleration at the sharpest place; |dR/ds| ≤ the larger straight's rate / cos φ.
    public override Stretch Stretch
    {
        get
        {
            var turnPerLength = Math.Max(before.TurnPerLength, after.TurnPerLength) / corner.CosHalfTurn;
            var programmed = Math.Min(before.Speed, after.Speed);
            var speed = Math.Min(
                Math.Min(programmed, controller.ToolTurnSpeed / turnPerLength),
                Math.Sqrt(controller.ToolAcceleration * corner.SmallestRadius));
            return new(Length, speed, Math.Min(controller.ToolAcceleration, controller.ToolTurnAcceleration / turnPerLength));
        }
    }

    public override PathPoint At(double s)
    {
        var (u, rate) = corner.ShareAt(s);
        var rest = 1 - u;
        var made = RotationVector.ToQuaternion(u * u * turnAfter);
        var missing = RotationVector.ToQuaternion(-(rest * rest) * turnBefore);
        var turnRate = 2 * u * rate * turnAfter + RotationMatrix.FromQuaternion(made) * (2 * rest * rate * turnBefore);
        return new(
            corner.At(u),
            made * missing * before.EndOrientation,
            rate * corner.Derivative(u),
            turnRate,
            u < 0.5 ? before.Waypoint : after.Waypoint,
            before.EndTravel + (2 * u - 1) * reach);
    }
}
