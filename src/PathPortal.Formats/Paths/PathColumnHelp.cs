using System.Collections.Immutable;

namespace PathPortal.Formats.Paths;

/// <summary>What one column, or group of columns, of a path file means; for documentation and pages.</summary>
/// <param name="Columns">The names as written in the header.</param>
/// <param name="Meaning">One or two sentences.</param>
/// <param name="Blank">What a blank cell means.</param>
public sealed record PathColumnHelp(string Columns, string Meaning, string Blank)
{
    private const string Repeats = "as in the row above";

    /// <summary>Every column in a useful order.</summary>
    public static ImmutableArray<PathColumnHelp> All { get; } =
    [
        new("x_mm, y_mm, z_mm (or x_m, y_m, z_m)", "Tool centre point in the work frame. Needed.", "refused"),
        new("qw, qx, qy, qz", "Orientation of the tool frame in the work frame as a quaternion, scalar first. One of the four ways to give it is needed.", Repeats),
        new(
            "fixed_xyz_1_deg, fixed_xyz_2_deg, fixed_xyz_3_deg (or _rad)",
            "Orientation by angles: about the fixed x, then the fixed y, then the fixed z axis (roll, pitch, yaw). Any other order of axes is named the same way, "
            + "and “moving” in place of “fixed” turns about axes that move along, as in moving_zyz_1_deg.", Repeats),
        new("axis_to_tip_x, axis_to_tip_y, axis_to_tip_z", "Direction of the tool axis from the holder to the tip: the z axis of the tool frame. The turn about it stays open.", Repeats),
        new("axis_to_holder_x, axis_to_holder_y, axis_to_holder_z", "Direction of the tool axis from the tip to the holder, as cutter-location data give it.", Repeats),
        new("motion", "“straight” or “joint”: how the tool gets from the row above to this one. The first row is the start.", Repeats + "; straight at first"),
        new("speed_mm_s (or speed_m_s)", "Tool speed of straight moves.", Repeats),
        new("joint_speed_percent", "Share of the joint speed limits that joint moves use.", Repeats + "; 50 at first"),
        new("process", "“on” or “off” on the way to this row.", Repeats + "; off at first"),
        new("task", "Directions the process needs: “pose” all six; “axis” position and tool axis (drilling, dispensing, milling); “point” position only (a ball-shaped tool).", Repeats + "; pose at first, axis where a tool axis is given"),
        new("corner_mm (or corner_m)", "How far before and after this point the corner is rounded.", "0: the tool stops here"),
        new("lead_in_mm (or lead_in_m)", "Where a process section begins with this row: its first length that is not judged.", "0"),
        new("dwell_s", "Pause after reaching the point.", "0"),
        new("j1_deg … j8_deg (or _rad; j1_mm or j1_m for sliding joints)", "Posture at the end of a joint move, the controller's joint values.", "the nearest posture"),
        new("label", "Text of at most 200 characters.", "no label"),
    ];
}
