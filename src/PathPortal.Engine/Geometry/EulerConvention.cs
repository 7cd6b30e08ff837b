namespace PathPortal.Engine.Geometry;

/// <summary>
/// How three angles make a rotation. "Moving" turns about the axes as already turned: R = R_first(a) R_second(b) R_third(c). "Fixed" turns about
/// the axes that stay: R = R_third(c) R_second(b) R_first(a). Angles are always given in the order the axes are named.
/// </summary>
public enum EulerConvention
{
    /// <summary>Roll, pitch, yaw about fixed x, y, z: R = Rz(yaw) Ry(pitch) Rx(roll).</summary>
    FixedXyz,
    FixedXzy,
    FixedYxz,
    FixedYzx,
    FixedZxy,
    FixedZyx,
    FixedXyx,
    FixedXzx,
    FixedYxy,
    FixedYzy,
    FixedZxz,
    FixedZyz,
    MovingXyz,
    MovingXzy,
    MovingYxz,
    MovingYzx,
    MovingZxy,

    /// <summary>Yaw, pitch, roll about moving z, y, x: R = Rz(a) Ry(b) Rx(c).</summary>
    MovingZyx,
    MovingXyx,
    MovingXzx,
    MovingYxy,
    MovingYzy,
    MovingZxz,

    /// <summary>R = Rz(a) Ry(b) Rz(c).</summary>
    MovingZyz,
}
