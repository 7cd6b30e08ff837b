using PathPortal.Engine.Geometry;

namespace PathPortal.Engine.Paths;

/// <summary>How far the tool is from the programmed geometry, by component.</summary>
/// <param name="Across">Distance at right angles to the programmed tool axis (m).</param>
/// <param name="StandOff">Distance along the programmed tool axis (m), never negative.</param>
/// <param name="Axis">Angle between programmed and true tool axis (rad).</param>
internal readonly record struct PathDeviation(double Across, double StandOff, double Axis)
{
    public static PathDeviation None => default;

    /// <summary>A tool at its programmed place.</summary>
    public static PathDeviation Between(Vector3D point, Vector3D axis, Vector3D programmed, Vector3D programmedAxis) =>
        Missing(point, programmed, programmedAxis) with
        {
            Axis = Deterministic.Atan2(axis.Cross(programmedAxis).Norm, axis.Dot(programmedAxis)),
        };

    /// <summary>A programmed place the tool came no nearer to than this; it says nothing of the tool's axis there.</summary>
    public static PathDeviation Missing(Vector3D point, Vector3D programmed, Vector3D programmedAxis)
    {
        var gap = point - programmed;
        var along = gap.Dot(programmedAxis);
        return new((gap - along * programmedAxis).Norm, Math.Abs(along), 0);
    }

    /// <summary>The larger of each component; a value that is not a number stays.</summary>
    public PathDeviation Worse(PathDeviation other) =>
        new(Math.Max(Across, other.Across), Math.Max(StandOff, other.StandOff), Math.Max(Axis, other.Axis));
}
