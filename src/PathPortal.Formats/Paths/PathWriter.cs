using System.Collections.Immutable;
using System.Globalization;
using System.Text;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Paths;

namespace PathPortal.Formats.Paths;

/// <summary>Writes a path in the format <see cref="PathReader"/> reads, every value in every row.</summary>
internal static class PathWriter
{
    private const int Mm = 3;
    private const int Percent = 2;

    public static string Write(ToolPath path, IReadOnlyList<JointKind>? jointKinds)
    {
        jointKinds ??= path.PostureKinds.IsEmpty ? null : path.PostureKinds;
        var joints = path.Waypoints.Max(p => p.Joints?.Length ?? 0);
        var text = new StringBuilder("x_mm,y_mm,z_mm,qw,qx,qy,qz,motion,task,process,speed_mm_s,joint_speed_percent,corner_mm,lead_in_mm,dwell_s");
        for (var j = 0; j < joints; j++)
        {
            var prismatic = jointKinds is not null && jointKinds[j] == JointKind.Prismatic;
            text.Append(CultureInfo.InvariantCulture, $",j{j + 1}_{(prismatic ? "m" : "rad")}");
        }

        text.Append(",label\r\n");
        foreach (var point in path.Waypoints)
        {
            WritePoint(text, point, joints);
        }

        return text.ToString();
    }

    private static void WritePoint(StringBuilder text, Waypoint p, int joints)
    {
        ReadOnlySpan<string> cells =
        [
            CellNumber.Text(p.Position.X, Mm), CellNumber.Text(p.Position.Y, Mm), CellNumber.Text(p.Position.Z, Mm),
            CellNumber.Text(p.Orientation.W, 0), CellNumber.Text(p.Orientation.X, 0), CellNumber.Text(p.Orientation.Y, 0),
            CellNumber.Text(p.Orientation.Z, 0),
            p.Motion == MotionKind.Joint ? "joint" : "straight",
            p.Task switch { TaskKind.Axis => "axis", TaskKind.Point => "point", _ => "pose" },
            p.ProcessOn ? "on" : "off",
            p.Speed > 0 ? CellNumber.Text(p.Speed, Mm) : "",
            CellNumber.Text(p.JointSpeedShare, Percent),
            OrBlank(p.CornerReach, Mm), OrBlank(p.LeadIn, Mm), OrBlank(p.Dwell, 0),
        ];
        text.AppendJoin(',', cells);
        for (var j = 0; j < joints; j++)
        {
            text.Append(',').Append(p.Joints is { } values ? CellNumber.Text(values[j], 0) : "");
        }

        text.Append(',').Append(CsvText.Cell(p.Label)).Append("\r\n");
    }

    private static string OrBlank(double value, int shift) => value == 0 ? "" : CellNumber.Text(value, shift);
}
