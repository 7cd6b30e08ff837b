using PathPortal.Engine.Geometry;

namespace PathPortal.Engine.Postures;

/// <summary>
/// Names a branch of a spherical-wrist arm by where its parts are. Shoulder front: the wrist centre is on the side of axis 1 that joint 1 faces
/// (base x at motion zero). Elbow up: axis 3 lies above the straight line from axis 2 to the wrist centre, seen along axis 1. Wrist not flipped:
/// joint 5 bends axis 6 out of axis 4 in the positive sense.
/// </summary>
internal sealed class SphericalWristWords
{
    private const double Straight = 1e-6; // rad or m: below this a bend has no side

    private readonly ScrewAxis[] axes;
    private readonly Vector3D wristCentre;
    private readonly Vector3D facing;

    public SphericalWristWords(ScrewAxis[] axes, Vector3D wristCentre)
    {
        this.axes = axes;
        this.wristCentre = wristCentre;
        var front = axes[0].Direction.Cross(axes[1].Direction).Normalised();
        var towards = Math.Abs(front.X) > Straight ? front.X : Math.Abs(front.Y) > Straight ? front.Y : front.Z;
        facing = towards < 0 ? -front : front;
    }

    /// <summary>The branch in words, for motions θ about the six axes (rad).</summary>
    public string Describe(ReadOnlySpan<double> motions) =>
        $"shoulder {Shoulder(motions)}, elbow {Elbow(motions)}, wrist {Wrist(motions)}";

    // Everything before joint 1 moves; joint 1 turns the whole arm, so it drops out of all three questions.
    private Vector3D Centre(ReadOnlySpan<double> motions) =>
        axes[1].Move(motions[1], axes[2].Move(motions[2], wristCentre));

    private string Shoulder(ReadOnlySpan<double> motions)
    {
        var ahead = facing.Dot(Centre(motions) - axes[0].Point);
        return ahead > Straight ? "front" : ahead < -Straight ? "back" : "over axis 1";
    }

    private string Elbow(ReadOnlySpan<double> motions)
    {
        var n2 = axes[1].Direction;
        var elbow = Across(axes[1].Move(motions[1], axes[2].Point) - axes[1].Point, n2);
        var line = Across(Centre(motions) - axes[1].Point, n2);
        var length = line.Dot(line);
        var bend = length > Straight * Straight ? elbow - elbow.Dot(line) / length * line : elbow;
        if (!(bend.Norm > Straight))
        {
            return "straight";
        }

        var up = bend.Dot(axes[0].Direction);
        return Math.Abs(up) > Straight
            ? up > 0 ? "up" : "down"
            : bend.Dot(facing) > 0 ? "forward" : "backward";
    }

    private string Wrist(ReadOnlySpan<double> motions)
    {
        var bend = axes[4].Direction.Dot(axes[3].Direction.Cross(axes[4].Turn(motions[4], axes[5].Direction)));
        return bend > Straight ? "not flipped" : bend < -Straight ? "flipped" : "straight";
    }

    private static Vector3D Across(Vector3D v, Vector3D direction) => v - direction.Dot(v) * direction;
}
