using System.Collections.Immutable;
using PathPortal.Engine.Geometry;

namespace PathPortal.Engine.Arms;

/// <summary>A serial arm: 1 to 8 joints from base to mechanical interface (flange). Immutable; safe to share between threads.</summary>
public sealed record ArmModel
{
    public const int MaxJoints = 8;

    public required string Name { get; init; }

    /// <summary>The joints from base to flange, 1..8.</summary>
    public required ImmutableArray<Joint> Joints { get; init; }

    /// <summary>The mechanical interface in the moved frame of the last joint, X_NF.</summary>
    public required RigidTransform FlangeInLastJoint { get; init; }

    /// <summary>
    /// L in metres, above zero: divides the linear rows of the Jacobian and multiplies prismatic columns, so that singular values of mixed units
    /// can be compared. Printed wherever a singular value is.
    /// </summary>
    public required double CharacteristicLength { get; init; }
}
