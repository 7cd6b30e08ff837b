using System.Globalization;
using PathPortal.Engine.Arms;
using PathPortal.Formats.Documents;
using PathPortal.Formats.Paths;
using PathPortal.Formats.Problems;

namespace PathPortal.Formats.Tables;

/// <summary>Reads header and rows of a DH table.</summary>
internal sealed class DhTableRows(CsvRows rows, ProblemList problems)
{
    private static readonly string[] Names =
    [
        "name", "kind", "sign", "theta_deg", "d_mm", "a_mm", "alpha_deg", "a_before_mm", "alpha_before_deg", "continuous", "source",
        "low_deg", "high_deg", "speed_deg_s", "acceleration_deg_s2", "low_mm", "high_mm", "speed_mm_s", "acceleration_mm_s2",
    ];

    private readonly Dictionary<string, int> _columns = new(StringComparer.Ordinal);

    /// <summary>Which kind of table the column names say this is.</summary>
    public ArmKinematics Kinematics => _columns.ContainsKey("a_before_mm") ? ArmKinematics.DhModified : ArmKinematics.DhStandard;

    public bool ReadHeader()
    {
        for (var i = 0; i < rows.Cells.Count; i++)
        {
            var name = rows.Shown(rows.Cells[i]).ToLowerInvariant();
            if (!Names.Contains(name))
            {
                Wrong(
                    rows.Cells[i], "",
                    NearestName.Of(name, Names) is { } near ? $"a known column; nearest is “{near}”" : "one of " + string.Join(", ", Names),
                    "The column is not known.");
            }
            else if (!_columns.TryAdd(name, i))
            {
                Wrong(rows.Cells[i], name, "each column once", "The column is there twice.");
            }
        }

        var modified = _columns.ContainsKey("a_before_mm") || _columns.ContainsKey("alpha_before_deg");
        if (modified && (_columns.ContainsKey("a_mm") || _columns.ContainsKey("alpha_deg")))
        {
            problems.Add(
                rows.Line, 1, "", "", "a_mm, alpha_deg (standard) or a_before_mm, alpha_before_deg (modified)",
                "The table mixes both conventions.");
        }

        foreach (var needed in (string[])["theta_deg", "d_mm", modified ? "a_before_mm" : "a_mm", modified ? "alpha_before_deg" : "alpha_deg"])
        {
            if (!problems.Any && !_columns.ContainsKey(needed))
            {
                problems.Add(rows.Line, 1, needed, "", $"a column {needed}", "A column is missing.");
            }
        }

        return !problems.Any;
    }

    public JointDocument ReadJoint(int number)
    {
        var joint = new JointDocument();
        if (rows.Fault is { } fault)
        {
            Wrong(fault.Cell, "", fault.Expected, fault.Message);
            return joint;
        }

        if (rows.Cells.Count != _columns.Count)
        {
            Wrong(
                rows.Cells[^1], "", string.Create(CultureInfo.InvariantCulture, $"{_columns.Count} cells as in the header"),
                string.Create(CultureInfo.InvariantCulture, $"The row has {rows.Cells.Count} cells."));
            return joint;
        }

        var modified = Kinematics == ArmKinematics.DhModified;
        var kind = Word("kind", "revolute", "prismatic") == "prismatic" ? JointKind.Prismatic : JointKind.Revolute;
        var source = Text("source") is { Length: > 0 } given ? given : "DH table";
        return joint with
        {
            Name = Text("name") is { Length: > 0 } name ? name : string.Create(CultureInfo.InvariantCulture, $"J{number}"),
            Kind = kind,
            Sign = Number("sign") is { } sign ? (sign == 1 ? 1 : sign == -1 ? -1 : 0) : 1,
            ThetaDeg = Number("theta_deg") ?? 0,
            DMm = Number("d_mm") ?? 0,
            AMm = Number(modified ? "a_before_mm" : "a_mm") ?? 0,
            AlphaDeg = Number(modified ? "alpha_before_deg" : "alpha_deg") ?? 0,
            Limits = new()
            {
                Continuous = Word("continuous", "no", "yes") == "yes",
                Low = Limit("low", kind, "", source),
                High = Limit("high", kind, "", source),
                Speed = Limit("speed", kind, "_s", source),
                Acceleration = Limit("acceleration", kind, "_s2", source),
            },
        };
    }

    // A limit in the unit of the other kind of joint is refused, not converted.
    private LimitDocument? Limit(string what, JointKind kind, string per, string source)
    {
        var (own, other) = kind == JointKind.Revolute ? ("deg", "mm") : ("mm", "deg");
        if (Text($"{what}_{other}{per}").Length > 0)
        {
            var cell = rows.Cells[_columns[$"{what}_{other}{per}"]];
            Wrong(
                cell, $"{what}_{other}{per}", $"a blank cell, and the limit in {what}_{own}{per}",
                "The unit does not fit the kind of the joint.");
        }

        return Number($"{what}_{own}{per}") is { } value ? new() { Value = value, Source = source } : null;
    }

    private string Text(string name) => _columns.TryGetValue(name, out var at) ? rows.Text(rows.Cells[at]) : "";

    // A needed number may be blank: an empty place in such a table means zero.
    private double? Number(string name)
    {
        if (Text(name).Length == 0)
        {
            return null;
        }

        var cell = rows.Cells[_columns[name]];
        if (CellNumber.TryParse(rows.Bytes(cell), 0, out var value))
        {
            return value;
        }

        Wrong(cell, name, "a number", NumberFault.Of(rows.Shown(cell)));
        return null;
    }

    private string Word(string name, string usual, string other)
    {
        var text = Text(name).ToLowerInvariant();
        if (text.Length > 0 && text != usual && text != other)
        {
            Wrong(rows.Cells[_columns[name]], name, $"{usual} or {other}", "This word is not known here.");
        }

        return text.Length == 0 ? usual : text;
    }

    private void Wrong(CsvCell cell, string field, string expected, string message) =>
        problems.Add(cell.Line, rows.ColumnOf(cell), field, rows.Shown(cell), expected, message);
}
