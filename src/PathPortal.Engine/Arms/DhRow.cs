using PathPortal.Engine.Geometry;

namespace PathPortal.Engine.Arms;

/// <summary>
/// One row of a Denavit–Hartenberg table; which link a and α belong to is a matter of the table (<see cref="StandardDhTable"/>,
/// <see cref="ModifiedDhTable"/>).
/// </summary>
/// <param name="A">Link length (m), along x.</param>
/// <param name="Alpha">Link twist, about x.</param>
/// <param name="D">Link offset (m), along z; constant also for a prismatic joint, whose motion adds to it.</param>
/// <param name="Theta">Constant joint angle, about z; a revolute joint's motion adds to it.</param>
/// <param name="Sign">+1 or −1: sense of the controller's joint value.</param>
/// <param name="Zero">Added to <c>Sign · q</c> (rad or m).</param>
public sealed record DhRow(
    string Name, JointKind Kind, double A, Angle Alpha, double D, Angle Theta, int Sign, double Zero, JointLimits Limits)
{
    // Trans x(a) and Rot x(α) commute, as do Rot z(θ) and Trans z(d).
    internal RigidTransform AlongX => new(RotationMatrix.AboutX(Alpha), new(A, 0, 0));

    internal RigidTransform AlongZ => new(RotationMatrix.AboutZ(Theta), new(0, 0, D));
}
