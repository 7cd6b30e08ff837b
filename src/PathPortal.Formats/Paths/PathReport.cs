using System.Collections.Immutable;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Geometry;

namespace PathPortal.Formats.Paths;

/// <summary>What a path file holds, in figures. SI, work frame.</summary>
public sealed record PathReport
{
    public required int Points { get; init; }

    public required int StraightMoves { get; init; }

    public required int JointMoves { get; init; }

    /// <summary>Sum of the straight moves before corner rounding (m). Joint moves count nothing: their way depends on the arm.</summary>
    public required double StraightLength { get; init; }

    /// <summary>Part of <see cref="StraightLength"/> with the process on (m).</summary>
    public required double ProcessLength { get; init; }

    /// <summary>Smallest coordinates of the points (m).</summary>
    public required Vector3D Low { get; init; }

    /// <summary>Largest coordinates of the points (m).</summary>
    public required Vector3D High { get; init; }

    /// <summary>Kinds of the joints the posture columns stand for, by their units; empty without posture columns. An arm must match.</summary>
    public required ImmutableArray<JointKind> PostureKinds { get; init; }
}
