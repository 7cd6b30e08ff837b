using System.Collections.Immutable;
using PathPortal.Formats.Problems;

namespace PathPortal.Formats.Paths;

/// <summary>Reads the header line of a path file.</summary>
internal sealed class PathHeader(CsvRows rows, ProblemList problems)
{
    private static readonly PathQuantity[] OrientationKinds =
        [PathQuantity.Quaternion, PathQuantity.Angles, PathQuantity.AxisToTip, PathQuantity.AxisToHolder];

    /// <summary>The layout, or null with problems added. The rows stand on the header.</summary>
    public PathLayout? Read()
    {
        if (!LooksLikeHeader())
        {
            return null;
        }

        if (rows.Fault is { } fault)
        {
            problems.Add(fault.Cell.Line, rows.ColumnOf(fault.Cell), "", rows.Shown(fault.Cell), fault.Expected, fault.Message);
            return null;
        }

        var columns = ReadNames();
        if (problems.Any)
        {
            return null;
        }

        var position = Group(columns, PathQuantity.Position, 3, "x_mm, y_mm, z_mm (or x_m, y_m, z_m)");
        if (position.IsEmpty && !problems.Any)
        {
            Missing("x_mm, y_mm, z_mm (or x_m, y_m, z_m)", "The position columns are missing.");
        }

        var kinds = OrientationKinds.Where(k => columns.Any(c => c.Quantity == k)).ToArray();
        if (kinds.Length == 0)
        {
            Missing(
                "one way to give the orientation: qw, qx, qy, qz; or three angles such as fixed_xyz_1_deg … fixed_xyz_3_deg; or axis_to_tip_x, _y, _z",
                "The orientation columns are missing.");
        }
        else if (kinds.Length > 1)
        {
            var second = columns.FindIndex(c => OrientationKinds.Contains(c.Quantity) && c.Quantity != FirstOrientation(columns));
            At(second, "one way to give the orientation", "The orientation is given in two ways.");
        }

        var orientation = kinds.Length == 1 ? Group(columns, kinds[0], kinds[0] == PathQuantity.Quaternion ? 4 : 3, "every part of the orientation") : [];
        var posture = Group(columns, PathQuantity.Posture, columns.Count(c => c.Quantity == PathQuantity.Posture), "joints counted from j1 without gaps");
        return problems.Any
            ? null
            : new PathLayout { Columns = [.. columns], Position = position, OrientationKind = kinds[0], Orientation = orientation, Posture = posture };
    }

    private static PathQuantity FirstOrientation(List<PathColumn> columns) =>
        columns.First(c => OrientationKinds.Contains(c.Quantity)).Quantity;

    private bool LooksLikeHeader()
    {
        var first = rows.Cells[0];
        var text = rows.Shown(first);
        var column = rows.ColumnOf(first);
        if (text.StartsWith('<') || text.StartsWith('{') || text.StartsWith('['))
        {
            problems.Add(
                first.Line, column, "", text, "a header line with column names, then rows of numbers",
                "This looks like XML or JSON, not like a path file.");
            return false;
        }

        if (rows.Cells.Count == 1)
        {
            var (mark, name) = text.Contains(';', StringComparison.Ordinal) ? (';', "semicolons") : text.Contains('\t', StringComparison.Ordinal) ? ('\t', "tabs") : ('|', "bars");
            if (text.Contains(mark, StringComparison.Ordinal))
            {
                problems.Add(
                    first.Line, column + text.IndexOf(mark, StringComparison.Ordinal), "", mark.ToString(),
                    "commas between cells and points in numbers",
                    $"The cells are separated by {name}.");
                return false;
            }
        }

        if (rows.Cells.All(c => c.Length == 0 || CellNumber.TryParse(rows.Bytes(c), 0, out _)))
        {
            problems.Add(
                first.Line, column, "", text, "a header line with column names such as x_mm", "The first line holds no column names.");
            return false;
        }

        return true;
    }

    private List<PathColumn> ReadNames()
    {
        var columns = new List<PathColumn>();
        foreach (var cell in rows.Cells)
        {
            // Only A–Z are folded: no culture's idea of capital letters may change a column's meaning.
            var name = rows.Shown(cell).ToLowerInvariant();
            if (PathColumn.Find(name) is not { } column)
            {
                problems.Add(
                    cell.Line, rows.ColumnOf(cell), "", rows.Shown(cell),
                    NearestName.Of(name, PathColumn.Names) is { } near ? $"a known column; nearest is “{near}”" : "a known column with its unit, such as x_mm",
                    name.Length == 0 ? "A column has no name." : "The column is not known.");
                continue;
            }

            var same = columns.Find(c => c.Quantity == column.Quantity && c.Part == column.Part && c.Convention == column.Convention);
            var unlike = columns.Find(c => c.Quantity == column.Quantity && IsOneUnit(column.Quantity) && !UnitsAgree(c, column));
            if (same == column)
            {
                problems.Add(
                    cell.Line, rows.ColumnOf(cell), column.Name, rows.Shown(cell), "each column once", "The column is there twice.");
            }
            else if (same is not null)
            {
                problems.Add(
                    cell.Line, rows.ColumnOf(cell), column.Name, rows.Shown(cell), $"one unit; “{same.Name}” is there already",
                    "The same quantity is given in two units.");
            }
            else if (unlike is not null)
            {
                problems.Add(
                    cell.Line, rows.ColumnOf(cell), column.Name, rows.Shown(cell), $"the unit or convention of “{unlike.Name}”",
                    "Columns of one quantity differ in unit or convention.");
            }

            columns.Add(column);
        }

        return columns;
    }

    private static bool IsOneUnit(PathQuantity quantity) => quantity is PathQuantity.Position or PathQuantity.Angles or PathQuantity.Posture;

    // Joints may differ in kind, and then in unit, but not write one kind in two units.
    private static bool UnitsAgree(PathColumn a, PathColumn b) => a.Quantity == PathQuantity.Posture
        ? a.Unit == b.Unit || (a.Unit is "mm" or "m") != (b.Unit is "mm" or "m")
        : a.Unit == b.Unit && a.Convention == b.Convention;

    private ImmutableArray<int> Group(List<PathColumn> columns, PathQuantity quantity, int parts, string expected)
    {
        var indices = Enumerable.Range(0, parts).Select(p => columns.FindIndex(c => c.Quantity == quantity && c.Part == p)).ToImmutableArray();
        if (indices.All(i => i < 0))
        {
            return [];
        }

        if (indices.Contains(-1))
        {
            var some = columns.FindIndex(c => c.Quantity == quantity);
            At(some, expected, "Columns that belong to this one are missing.");
        }

        return indices;
    }

    private void At(int index, string expected, string message)
    {
        var cell = rows.Cells[index];
        problems.Add(cell.Line, rows.ColumnOf(cell), rows.Shown(cell), rows.Shown(cell), expected, message);
    }

    private void Missing(string expected, string message) => problems.Add(rows.Line, 1, "", "", expected, message);
}
