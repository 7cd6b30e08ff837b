using PathPortal.Engine.Geometry;
using PathPortal.Formats.Documents;
using PathPortal.Formats.Problems;

namespace PathPortal.Formats.Paths;

/// <summary>
/// Reads the orientation cells of one row after the other. By tool axis: the first orientation is the shortest turn from the work frame's z axis,
/// each further one the shortest turn on from the row before, so that nothing spins between two rows.
/// </summary>
internal sealed class PathOrientation(CsvRows rows, PathLayout layout, ProblemList problems)
{
    // Four decimals in each component leave the norm within 1e-3 of 1; farther off is worth a word, far off is something else than a quaternion.
    private const double RoundedNorm = 1e-3;
    private const double PlausibleNorm = 0.1;

    private readonly double[] _values = new double[4];
    private UnitQuaternion _last = UnitQuaternion.Identity;
    private Vector3D _axis;

    /// <summary>First line whose quaternion was scaled by more than rounding explains; 0 when none was.</summary>
    public int FirstScaledLine { get; private set; }

    public int ScaledRows { get; private set; }

    /// <summary>Largest angle read, in the unit of the column, and whether all were whole numbers.</summary>
    public double LargestAngle { get; private set; }

    public bool WholeAngles { get; private set; } = true;

    public UnitQuaternion Read(bool first)
    {
        var given = 0;
        foreach (var at in layout.Orientation)
        {
            given += rows.Cells[at].Length > 0 ? 1 : 0;
        }

        if (given == 0)
        {
            if (first)
            {
                Wrong(
                    layout.Orientation[0], "an orientation; only later rows may leave it blank to keep it",
                    "The first row has no orientation.");
            }

            return _last;
        }

        if (given < layout.Orientation.Length)
        {
            var blank = layout.Orientation.First(c => rows.Cells[c].Length == 0);
            Wrong(blank, "every part of the orientation, or none to keep that of the row above", "The orientation is not complete.");
            return _last;
        }

        return Numbers() ? _last = FromValues(first) : _last;
    }

    private bool Numbers()
    {
        var fine = true;
        for (var i = 0; i < layout.Orientation.Length; i++)
        {
            var at = layout.Orientation[i];
            if (!CellNumber.TryParse(rows.Bytes(rows.Cells[at]), 0, out _values[i]))
            {
                Wrong(
                    at, "a number" + (layout.Columns[at].Unit.Length == 0 ? "" : " in " + layout.Columns[at].Unit),
                    NumberFault.Of(rows.Shown(rows.Cells[at])));
                fine = false;
            }
        }

        return fine;
    }

    private UnitQuaternion FromValues(bool first) => layout.OrientationKind switch
    {
        PathQuantity.Quaternion => FromQuaternion(),
        PathQuantity.Angles => FromAngles(),
        _ => FromAxis(first),
    };

    private UnitQuaternion FromQuaternion()
    {
        var norm = Math.Sqrt(_values[0] * _values[0] + _values[1] * _values[1] + _values[2] * _values[2] + _values[3] * _values[3]);
        if (!(norm > 1e-6))
        {
            Wrong(layout.Orientation[0], "four numbers with a norm of 1", "The quaternion is zero, so it has no direction.");
            return _last;
        }

        if (!(Math.Abs(norm - 1) <= PlausibleNorm))
        {
            Wrong(
                layout.Orientation[0], "four numbers with a norm of 1",
                string.Create(System.Globalization.CultureInfo.InvariantCulture, $"The quaternion has the norm {norm:G4}; it is no rotation."));
            return _last;
        }

        if (Math.Abs(norm - 1) > RoundedNorm)
        {
            ScaledRows++;
            FirstScaledLine = FirstScaledLine == 0 ? rows.Line : FirstScaledLine;
        }

        return UnitQuaternion.FromComponents(_values[0], _values[1], _values[2], _values[3]);
    }

    private UnitQuaternion FromAngles()
    {
        var column = layout.Columns[layout.Orientation[0]];
        var most = column.Unit == "deg" ? 720 : 4 * Math.PI;
        for (var i = 0; i < 3; i++)
        {
            var size = Math.Abs(_values[i]);
            if (!(size <= most))
            {
                Wrong(
                    layout.Orientation[i],
                    column.Unit == "deg" ? "an angle from -720 to 720 degrees" : "an angle within two turns, -12.566 to 12.566 rad: are these degrees?",
                    "The angle is outside its range.");
                return _last;
            }

            LargestAngle = Math.Max(LargestAngle, size);
            WholeAngles &= size == Math.Floor(size);
        }

        var convention = OrientationConvention.ToEuler(column.Convention);
        return UnitQuaternion.FromMatrix(column.Unit == "deg"
            ? EulerAngles.ToMatrix(convention, Angle.FromDegrees(_values[0]), Angle.FromDegrees(_values[1]), Angle.FromDegrees(_values[2]))
            : EulerAngles.ToMatrix(convention, Angle.FromRadians(_values[0]), Angle.FromRadians(_values[1]), Angle.FromRadians(_values[2])));
    }

    private UnitQuaternion FromAxis(bool first)
    {
        var axis = new Vector3D(_values[0], _values[1], _values[2]);
        if (!(axis.Norm > 1e-6) || !double.IsFinite(axis.Norm))
        {
            Wrong(layout.Orientation[0], "a direction, best of length 1", "The tool axis has no direction.");
            return _last;
        }

        // The tool frame's z axis points from the holder to the tip.
        axis = layout.OrientationKind == PathQuantity.AxisToHolder ? -axis.Normalised() : axis.Normalised();
        var turned = first || _axis == default
            ? ToolAxisFrame.ShortestTurn(Vector3D.UnitZ, axis)
            : _axis == axis ? _last : ToolAxisFrame.ShortestTurn(_axis, axis) * _last;
        _axis = axis;
        return turned;
    }

    private void Wrong(int at, string expected, string message)
    {
        var cell = rows.Cells[at];
        problems.Add(cell.Line, rows.ColumnOf(cell), layout.Columns[at].Name, rows.Shown(cell), expected, message);
    }
}
