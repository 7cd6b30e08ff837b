using System.Collections.Immutable;
using PathPortal.Engine.Geometry;

namespace PathPortal.Engine.Arms;

/// <summary>
/// Denavit–Hartenberg, distal frames: T_i = Rot z(θ) Trans z(d) Trans x(a) Rot x(α), a and α of the link after the joint (Denavit and
/// Hartenberg 1955; Siciliano et al. 2009, sec. 2.8.2).
/// </summary>
/// <param name="Flange">The flange in the frame of the last row; identity when the table reaches the flange.</param>
public sealed record StandardDhTable(ImmutableArray<DhRow> Rows, RigidTransform Flange)
{
    public ArmModel ToArm(string name, double characteristicLength) => ChainLink.ToArm(
        name,
        [.. Rows.Select(r => new ChainLink(r.Name, r.Kind, r.AlongZ, r.Sign, r.Zero, r.AlongX, r.Limits))],
        Flange,
        characteristicLength);
}
