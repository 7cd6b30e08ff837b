using System.Collections.Immutable;
using PathPortal.Engine.Geometry;

namespace PathPortal.Engine.Arms;

/// <summary>
/// Denavit–Hartenberg, proximal frames: T_i = Rot x(α) Trans x(a) Rot z(θ) Trans z(d), a and α of the link before the joint (Craig,
/// Introduction to Robotics, ch. 3). The chain ends at the last joint: the last length belongs into <see cref="Flange"/>.
/// </summary>
/// <param name="Flange">The flange in the frame of the last joint.</param>
public sealed record ModifiedDhTable(ImmutableArray<DhRow> Rows, RigidTransform Flange)
{
    public ArmModel ToArm(string name, double characteristicLength) => ChainLink.ToArm(
        name,
        [.. Rows.Select(r => new ChainLink(r.Name, r.Kind, r.AlongX * r.AlongZ, r.Sign, r.Zero, RigidTransform.Identity, r.Limits))],
        Flange,
        characteristicLength);
}
