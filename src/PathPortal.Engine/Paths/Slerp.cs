using PathPortal.Engine.Geometry;

namespace PathPortal.Engine.Paths;

/// <summary>
/// Orientation between two given ones at a steady turn about one fixed axis, by the shorter way (Shoemake 1985). Immutable. For half a turn, where
/// both ways are equally long, the sign of the given quaternions decides.
/// </summary>
public readonly record struct Slerp
{
    private readonly UnitQuaternion from;

    private Slerp(UnitQuaternion from, Vector3D turn)
    {
        this.from = from;
        Turn = turn;
        Angle = turn.Norm;
    }

    /// <summary>The whole turn as a rotation vector (rad), in the axes in which the orientations are given; its derivative by share is constant.</summary>
    public Vector3D Turn { get; }

    /// <summary>The angle of the whole turn, in [0, π] (rad).</summary>
    public double Angle { get; }

    public static Slerp Between(UnitQuaternion from, UnitQuaternion to) => new(from, RotationVector.Of(to * from.Conjugate()));

    /// <summary>The orientation after a share 0..1 of the turn.</summary>
    public UnitQuaternion At(double share) => RotationVector.ToQuaternion(share * Turn) * from;
}
