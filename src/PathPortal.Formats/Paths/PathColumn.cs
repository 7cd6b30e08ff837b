using System.Collections.Frozen;
using System.Collections.Immutable;
using System.Globalization;
using PathPortal.Formats.Documents;

namespace PathPortal.Formats.Paths;

/// <summary>One column a path file may have.</summary>
/// <param name="Name">Lower-case name with its unit.</param>
/// <param name="Part">Which component of the quantity, from 0.</param>
/// <param name="Unit">mm, m, deg, rad, percent, s, mm/s, m/s; empty where there is none.</param>
/// <param name="Convention">Euler convention of an angle; else empty.</param>
internal sealed record PathColumn(string Name, PathQuantity Quantity, int Part, string Unit, string Convention = "")
{
    private static readonly FrozenDictionary<string, PathColumn> ByName = Build().ToFrozenDictionary(c => c.Name, StringComparer.Ordinal);

    /// <summary>Decimal shift from the column's unit to SI (or a share).</summary>
    public int Shift => Unit switch { "mm" or "mm/s" => -3, "percent" => -2, _ => 0 };

    public static ImmutableArray<string> Names { get; } = [.. Build().Select(c => c.Name)];

    public static PathColumn? Find(string name) => ByName.GetValueOrDefault(name);

    private static IEnumerable<PathColumn> Build()
    {
        foreach (var unit in (string[])["mm", "m"])
        {
            yield return new("x_" + unit, PathQuantity.Position, 0, unit);
            yield return new("y_" + unit, PathQuantity.Position, 1, unit);
            yield return new("z_" + unit, PathQuantity.Position, 2, unit);
            yield return new("corner_" + unit, PathQuantity.Corner, 0, unit);
            yield return new("lead_in_" + unit, PathQuantity.LeadIn, 0, unit);
            yield return new($"speed_{unit}_s", PathQuantity.Speed, 0, unit + "/s");
        }

        for (var part = 0; part < 4; part++)
        {
            yield return new("q" + "wxyz"[part], PathQuantity.Quaternion, part, "");
        }

        for (var part = 0; part < 3; part++)
        {
            yield return new("axis_to_tip_" + "xyz"[part], PathQuantity.AxisToTip, part, "");
            yield return new("axis_to_holder_" + "xyz"[part], PathQuantity.AxisToHolder, part, "");
            foreach (var convention in OrientationConvention.Angles)
            {
                foreach (var unit in (string[])["deg", "rad"])
                {
                    yield return new(
                        string.Create(CultureInfo.InvariantCulture, $"{convention}_{part + 1}_{unit}"), PathQuantity.Angles, part, unit,
                        convention);
                }
            }
        }

        for (var part = 0; part < Engine.Arms.ArmModel.MaxJoints; part++)
        {
            foreach (var unit in (string[])["deg", "rad", "mm", "m"])
            {
                yield return new(string.Create(CultureInfo.InvariantCulture, $"j{part + 1}_{unit}"), PathQuantity.Posture, part, unit);
            }
        }

        yield return new("motion", PathQuantity.Motion, 0, "");
        yield return new("joint_speed_percent", PathQuantity.JointSpeed, 0, "percent");
        yield return new("process", PathQuantity.Process, 0, "");
        yield return new("task", PathQuantity.Task, 0, "");
        yield return new("dwell_s", PathQuantity.Dwell, 0, "s");
        yield return new("label", PathQuantity.Label, 0, "");
    }
}
