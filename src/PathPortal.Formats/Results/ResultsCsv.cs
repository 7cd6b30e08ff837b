using System.Globalization;
using PathPortal.Engine;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Paths;
using PathPortal.Formats.Documents;
using PathPortal.Formats.Paths;

namespace PathPortal.Formats.Results;

/// <summary>
/// Every sample of a run as comma-separated text (RFC 4180), one row per sample, units in the column names. A blank cell is a value that does not
/// apply there; “inf” is a use of a limit without a number (a passed hard limit or a value that is not finite). Labels are escaped as in path files.
/// </summary>
public static class ResultsCsv
{
    private const int Mm = 3;
    private const int Percent = 2;

    /// <summary>Writes the samples.</summary>
    /// <param name="arm">The arm of the run: its joints' kinds give the units of the joint columns.</param>
    /// <param name="path">The path of the run, for line numbers and labels.</param>
    public static void Write(TextWriter writer, RunSamples samples, ArmModel arm, ToolPath path)
    {
        ArgumentNullException.ThrowIfNull(writer);
        ArgumentNullException.ThrowIfNull(samples);
        ArgumentNullException.ThrowIfNull(arm);
        ArgumentNullException.ThrowIfNull(path);
        var columns = Columns(samples, arm, path);
        writer.Write(string.Join(',', columns.Select(c => c.Name)));
        writer.Write("\r\n");
        for (var k = 0; k < samples.Count; k++)
        {
            for (var c = 0; c < columns.Count; c++)
            {
                if (c > 0)
                {
                    writer.Write(',');
                }

                writer.Write(columns[c].Cell(k));
            }

            writer.Write("\r\n");
        }
    }

    private static List<(string Name, Func<int, string> Cell)> Columns(RunSamples s, ArmModel arm, ToolPath path)
    {
        var columns = new List<(string Name, Func<int, string> Cell)>
        {
            ("time_s", k => Number(k * s.Period, 0)),
            ("reference_time_s", k => Number(s.ReferenceTime[k], 0)),
            ("path_percent", k => Number(s.PathFraction[k], Percent)),
            ("source_line", k => path.Waypoints[s.Waypoint[k]].SourceLine.ToString(CultureInfo.InvariantCulture)),
            ("label", k => CsvText.Cell(path.Waypoints[s.Waypoint[k]].Label)),
            ("process", k => s.Process[k] ? "on" : "off"),
        };
        for (var j = 0; j < s.JointCount; j++)
        {
            AddJoint(columns, s, j, arm.Joints[j].Kind);
        }

        AddPose(columns, "reference", s.ReferencePosition, s.ReferenceOrientation);
        AddPose(columns, "tool", s.ToolPosition, s.ToolOrientation);
        Add(columns, "tracking_error_mm", s.TrackingError, Mm);
        AddAngle(columns, "turn_error_deg", s.TurnError);
        Add(columns, "across_path_mm", s.AcrossPath, Mm);
        Add(columns, "stand_off_mm", s.StandOff, Mm);
        AddAngle(columns, "tool_axis_deg", s.ToolAxisAngle);
        Add(columns, "tool_speed_mm_s", s.ToolSpeed, Mm);
        Add(columns, "reference_speed_mm_s", s.ReferenceSpeed, Mm);
        Add(columns, "sigma_min", s.SigmaMin, 0);
        Add(columns, "sigma_max", s.SigmaMax, 0);
        Add(columns, "damping_squared", s.DampingSquared, 0);
        Add(columns, "speed_scale", s.SpeedScale, 0);
        Add(columns, "path_scale", s.PathScale, 0);
        foreach (var (criterion, use) in s.Use.OrderBy(u => u.Key))
        {
            Add(columns, $"use_{Words.Of(criterion)}_percent", use, Percent);
        }

        return columns;
    }

    private static void AddJoint(List<(string Name, Func<int, string> Cell)> columns, RunSamples s, int j, JointKind kind)
    {
        void Column(string suffix, double[][] values)
        {
            var (joint, name) = (values[j], string.Create(CultureInfo.InvariantCulture, $"j{j + 1}"));
            if (kind == JointKind.Revolute)
            {
                AddAngle(columns, $"{name}{string.Format(CultureInfo.InvariantCulture, suffix, "deg")}", joint);
            }
            else
            {
                Add(columns, $"{name}{string.Format(CultureInfo.InvariantCulture, suffix, "mm")}", joint, Mm);
            }
        }

        Column("_{0}", s.Joints);
        Column("_speed_{0}_s", s.JointSpeeds);
        Column("_speed_demand_{0}_s", s.JointSpeedDemands);
        Column("_acceleration_demand_{0}_s2", s.JointAccelerationDemands);
    }

    private static void AddPose(List<(string Name, Func<int, string> Cell)> columns, string of, double[][] position, double[][] orientation)
    {
        for (var axis = 0; axis < 3; axis++)
        {
            Add(columns, $"{of}_{"xyz"[axis]}_mm", position[axis], Mm);
        }

        for (var part = 0; part < 4; part++)
        {
            Add(columns, $"{of}_q{"wxyz"[part]}", orientation[part], 0);
        }
    }

    private static void Add(List<(string Name, Func<int, string> Cell)> columns, string name, double[] values, int shift) =>
        columns.Add((name, k => Number(values[k], shift)));

    private static void AddAngle(List<(string Name, Func<int, string> Cell)> columns, string name, double[] radians) =>
        columns.Add((name, k => Number(radians[k] * (180 / Math.PI), 0)));

    private static string Number(double value, int shift) => value switch
    {
        double.NaN => "",
        double.PositiveInfinity => "inf",
        double.NegativeInfinity => "-inf",
        _ => CellNumber.Text(value, shift),
    };
}
