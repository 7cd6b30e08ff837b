using System.Text;
using PathPortal.Formats.Documents;
using PathPortal.Formats.Paths;
using PathPortal.Formats.Problems;

namespace PathPortal.Formats.Tables;

/// <summary>
/// Denavit–Hartenberg tables as comma-separated text, one row per joint, units in the column names. Needed: <c>theta_deg, d_mm</c> and either
/// <c>a_mm, alpha_deg</c> (standard: of the link after the joint) or <c>a_before_mm, alpha_before_deg</c> (modified: of the link before it).
/// Optional: <c>name, kind (revolute, prismatic), sign, low_deg, high_deg, speed_deg_s, acceleration_deg_s2</c>, for prismatic joints
/// <c>low_mm, high_mm, speed_mm_s, acceleration_mm_s2</c>, <c>continuous</c> (yes, no) and <c>source</c> of the limits.
/// </summary>
public static class DhTableCsv
{
    private const int MaxBytes = ReadLimits.DocumentBytes;

    /// <summary>Reads a table as an arm document of this name; what it has no column for keeps its starting value.</summary>
    public static ReadResult<ArmDocument> Read(ReadOnlySpan<byte> source, string armName)
    {
        var problems = new ProblemList();
        if (SourceText.ToUtf8(source, MaxBytes, problems) is not { } utf8)
        {
            return ReadResult<ArmDocument>.Refused(problems);
        }

        var rows = new CsvRows(utf8);
        if (!rows.Next())
        {
            problems.Add(1, 1, "", "", "a header line with column names, then one row per joint", "The file holds no lines.");
            return ReadResult<ArmDocument>.Refused(problems);
        }

        var table = new DhTableRows(rows, problems);
        if (!table.ReadHeader())
        {
            return ReadResult<ArmDocument>.Refused(problems);
        }

        var arm = new ArmDocument { Name = armName, Kinematics = table.Kinematics };
        var lines = new List<int>();
        while (rows.Next() && arm.Joints.Count <= Engine.Arms.ArmModel.MaxJoints)
        {
            lines.Add(rows.Line);
            arm.Joints.Add(table.ReadJoint(arm.Joints.Count + 1));
        }

        foreach (var problem in problems.Any ? [] : arm.Validate())
        {
            var joint = lines.FindIndex(l => problem.Field.StartsWith($"joints[{lines.IndexOf(l)}]", StringComparison.Ordinal));
            problems.Add(problem with { Line = joint < 0 ? 0 : lines[joint] });
        }

        return ReadResult<ArmDocument>.Of(arm, problems);
    }

    public static ReadResult<ArmDocument> Read(string source, string armName) => Read(Encoding.UTF8.GetBytes(source), armName);
}
