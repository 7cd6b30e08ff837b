using System.Collections.Immutable;
using PathPortal.Engine.Arms;

namespace PathPortal.Formats.Paths;

/// <summary>Which column of a particular file holds what; −1 where the file has no such column.</summary>
internal sealed class PathLayout
{
    /// <summary>Columns of the file in their order.</summary>
    public required ImmutableArray<PathColumn> Columns { get; init; }

    public required ImmutableArray<int> Position { get; init; }

    public required PathQuantity OrientationKind { get; init; }

    public required ImmutableArray<int> Orientation { get; init; }

    /// <summary>Columns of the posture, joint 1 first; empty without one.</summary>
    public required ImmutableArray<int> Posture { get; init; }

    public ImmutableArray<JointKind> PostureKinds =>
        [.. Posture.Select(c => Columns[c].Unit is "mm" or "m" ? JointKind.Prismatic : JointKind.Revolute)];

    public bool ByToolAxis => OrientationKind is PathQuantity.AxisToTip or PathQuantity.AxisToHolder;

    public int IndexOf(PathQuantity quantity)
    {
        for (var i = 0; i < Columns.Length; i++)
        {
            if (Columns[i].Quantity == quantity)
            {
                return i;
            }
        }

        return -1;
    }
}
