using System.Collections.Immutable;
using System.Globalization;
using System.Text;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;
using PathPortal.Formats.Problems;

namespace PathPortal.Formats.Paths;

/// <summary>Turns the rows of a path file into waypoints. Keeps where each row began, for messages that need the whole path.</summary>
internal sealed class PathRows
{
    private const int MostProblems = 1000;
    private const double FarthestM = 100;

    private readonly byte[] _utf8;
    private readonly CsvRows _rows;
    private readonly PathLayout _layout;
    private readonly ProblemList _problems;
    private readonly PathOrientation _orientation;
    private readonly int _motionAt, _speedAt, _jointSpeedAt, _cornerAt, _processAt, _leadInAt, _taskAt, _dwellAt, _labelAt;

    // What a blank modal cell repeats.
    private MotionKind _motion = MotionKind.Straight;
    private TaskKind _task;
    private bool _process;
    private double _speed;
    private double _jointSpeedShare = 0.5;

    public PathRows(byte[] utf8, CsvRows rows, PathLayout layout, ProblemList problems)
    {
        (_utf8, _rows, _layout, _problems) = (utf8, rows, layout, problems);
        _orientation = new(rows, layout, problems);
        _task = layout.ByToolAxis ? TaskKind.Axis : TaskKind.Pose;
        _motionAt = layout.IndexOf(PathQuantity.Motion);
        _speedAt = layout.IndexOf(PathQuantity.Speed);
        _jointSpeedAt = layout.IndexOf(PathQuantity.JointSpeed);
        _cornerAt = layout.IndexOf(PathQuantity.Corner);
        _processAt = layout.IndexOf(PathQuantity.Process);
        _leadInAt = layout.IndexOf(PathQuantity.LeadIn);
        _taskAt = layout.IndexOf(PathQuantity.Task);
        _dwellAt = layout.IndexOf(PathQuantity.Dwell);
        _labelAt = layout.IndexOf(PathQuantity.Label);
    }

    public ImmutableArray<Waypoint>.Builder Waypoints { get; } = ImmutableArray.CreateBuilder<Waypoint>();

    /// <summary>First byte of each waypoint's row.</summary>
    public List<int> RowStarts { get; } = [];

    public PathOrientation Orientation => _orientation;

    public void ReadAll()
    {
        while (_rows.Next())
        {
            if (Waypoints.Count == ReadLimits.PathPoints)
            {
                _problems.Add(
                    _rows.Line, 1, "", "", $"at most {ReadLimits.PathPoints.ToString("N0", CultureInfo.InvariantCulture)} points",
                    "The path has too many points.");
                return;
            }

            if (_problems.Count >= MostProblems)
            {
                _problems.Stop();
                return;
            }

            ReadRow();
            if (_rows.Unclosed)
            {
                return;
            }
        }
    }

    /// <summary>Line and column of a cell of an earlier row.</summary>
    public (int Line, int Column, string Shown) PlaceOf(int point, int column)
    {
        var row = CsvRows.At(_utf8, RowStarts[point], Waypoints[point].SourceLine);
        var cell = row.Cells[column];
        return (cell.Line, row.ColumnOf(cell), row.Shown(cell));
    }

    private void ReadRow()
    {
        if (_rows.Fault is { } fault)
        {
            Wrong(fault.Cell, "", fault.Expected, fault.Message);
            return;
        }

        if (_rows.Cells.Count != _layout.Columns.Length)
        {
            WrongCount();
            return;
        }

        var before = _problems.Count;
        var first = Waypoints.Count == 0;
        var position = new Vector3D(Coordinate(0), Coordinate(1), Coordinate(2));
        var orientation = _orientation.Read(first);
        _motion = Word(_motionAt, _motion, ("straight", MotionKind.Straight), ("joint", MotionKind.Joint));
        _task = Word(_taskAt, _task, ("pose", TaskKind.Pose), ("axis", TaskKind.Axis), ("point", TaskKind.Point));
        _process = Word(_processAt, _process, ("on", true), ("off", false));
        _speed = Number(_speedAt, _speed, 0, false, 20, "above 0 and at most 20 m/s");
        _jointSpeedShare = Number(_jointSpeedAt, _jointSpeedShare, 0, false, 1, "above 0 and at most 100 %");
        if (!first && _motion == MotionKind.Straight && _speed == 0 && _problems.Count == before)
        {
            SpeedMissing();
        }

        var point = new Waypoint
        {
            SourceLine = _rows.Line,
            Label = Label(),
            Position = position,
            Orientation = orientation,
            Motion = _motion,
            Task = _task,
            Speed = _speed,
            JointSpeedShare = _jointSpeedShare,
            Joints = Posture(),
            CornerReach = Number(_cornerAt, 0, 0, true, 10, "from 0 to 10 m; 0 or blank: the tool stops here"),
            ProcessOn = _process,
            LeadIn = Number(_leadInAt, 0, 0, true, 10, "from 0 to 10 m"),
            Dwell = Number(_dwellAt, 0, 0, true, 3600, "from 0 to 3600 s"),
        };
        RowStarts.Add(_rows.Start);
        Waypoints.Add(point);
    }

    private double Coordinate(int part)
    {
        var at = _layout.Position[part];
        var cell = _rows.Cells[at];
        if (cell.Length == 0)
        {
            Wrong(at, $"a number in {_layout.Columns[at].Unit}; a position is given in every row", "The coordinate is missing.");
            return 0;
        }

        return Number(at, 0, -FarthestM, true, FarthestM, "from -100 to 100 m: are the units right?");
    }

    // The number in SI; the fallback where the column is not there or the cell is blank.
    private double Number(int at, double fallback, double low, bool lowAllowed, double high, string expected)
    {
        if (at < 0 || _rows.Cells[at].Length == 0)
        {
            return fallback;
        }

        var column = _layout.Columns[at];
        if (!CellNumber.TryParse(_rows.Bytes(_rows.Cells[at]), column.Shift, out var value))
        {
            Wrong(at, $"a number in {column.Unit}", NumberFault.Of(_rows.Shown(_rows.Cells[at])));
            return fallback;
        }

        if (!(lowAllowed ? value >= low : value > low) || !(value <= high))
        {
            Wrong(at, "a value " + expected, "The number is outside its range.");
            return fallback;
        }

        return value;
    }

    private T Word<T>(int at, T fallback, params ReadOnlySpan<(string Word, T Value)> words)
    {
        if (at < 0 || _rows.Cells[at].Length == 0)
        {
            return fallback;
        }

        var bytes = _rows.Bytes(_rows.Cells[at]);
        foreach (var (word, value) in words)
        {
            if (Ascii.EqualsIgnoreCase(bytes, word))
            {
                return value;
            }
        }

        var known = new List<string>();
        foreach (var (word, _) in words)
        {
            known.Add(word);
        }

        Wrong(at, "one of " + string.Join(", ", known) + ", or blank for the same as in the row above", "This word is not known here.");
        return fallback;
    }

    private ImmutableArray<double>? Posture()
    {
        var columns = _layout.Posture;
        var given = columns.Count(c => _rows.Cells[c].Length > 0);
        if (given == 0)
        {
            return null;
        }

        if (given < columns.Length)
        {
            Wrong(columns.First(c => _rows.Cells[c].Length == 0), "a value for every joint, or for none", "The posture is not complete.");
            return null;
        }

        var joints = ImmutableArray.CreateBuilder<double>(columns.Length);
        foreach (var at in columns)
        {
            var degrees = _layout.Columns[at].Unit == "deg";
            var value = _layout.Columns[at].Unit switch
            {
                "deg" => Number(at, 0, -36_000, true, 36_000, "from -36000 to 36000 degrees"),
                "rad" => Number(at, 0, -630, true, 630, "from -630 to 630 rad"),
                _ => Number(at, 0, -FarthestM, true, FarthestM, "from -100 to 100 m"),
            };
            joints.Add(degrees ? value * (Math.PI / 180) : value);
        }

        return joints.MoveToImmutable();
    }

    private string Label()
    {
        if (_labelAt < 0 || _rows.Cells[_labelAt].Length == 0)
        {
            return "";
        }

        var text = PathLabel.Read(_rows.Text(_rows.Cells[_labelAt]));
        if (text.Length > PathLabel.MostCharacters)
        {
            Wrong(_labelAt, $"at most {PathLabel.MostCharacters} characters", "The label is too long.");
        }
        else if (VisibleText.FirstHidden(text) >= 0)
        {
            Wrong(
                _labelAt, "text on one line without hidden characters", "The label holds a control, direction or other hidden character.");
        }

        return text;
    }

    // Said once where the column is missing: the value that stops the repetition is never used.
    private void SpeedMissing()
    {
        if (_speedAt >= 0)
        {
            Wrong(_speedAt, "a speed here or in a row above", "A straight move has no speed.");
        }
        else
        {
            _problems.Add(
                _rows.Line, 1, "", "", "a column speed_mm_s or speed_m_s", "A straight move has no speed: there is no speed column.");
            _speed = 1;
        }
    }

    private void WrongCount()
    {
        var (found, wanted) = (_rows.Cells.Count, _layout.Columns.Length);
        var cell = found > wanted ? _rows.Cells[wanted] : _rows.Cells[^1];
        var hint = found > wanted && _rows.Cells.Count(c => c.Length is > 0 and < 12 && !_rows.Bytes(c).ContainsAnyExceptInRange((byte)'0', (byte)'9')) > wanted / 2
            ? " Decimal commas split a number in two: write points."
            : "";
        Wrong(
            cell, "", string.Create(CultureInfo.InvariantCulture, $"{wanted} cells as in the header"),
            string.Create(CultureInfo.InvariantCulture, $"The row has {found} cells.{hint}"));
    }

    private void Wrong(int at, string expected, string message) => Wrong(_rows.Cells[at], _layout.Columns[at].Name, expected, message);

    private void Wrong(CsvCell cell, string field, string expected, string message) =>
        _problems.Add(cell.Line, _rows.ColumnOf(cell), field, _rows.Shown(cell), expected, message);
}
