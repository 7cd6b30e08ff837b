namespace PathPortal.Formats.Paths;

/// <summary>An invented path file to start from: approach by a joint move, one sealing bead with a rounded corner, retreat.</summary>
public static class PathExample
{
    public const string FileName = "example-path.csv";

    public const string Text = """
        # Invented example: one bead along two sides of a cover.
        # The first row is the start. A blank cell in motion, speed, process, task or orientation repeats the row above.
        x_mm,y_mm,z_mm,fixed_xyz_1_deg,fixed_xyz_2_deg,fixed_xyz_3_deg,motion,speed_mm_s,joint_speed_percent,process,lead_in_mm,corner_mm,task,dwell_s,label
        0,0,150,180,0,0,,,,off,,,pose,,above the start
        -20,0,50,,,,joint,,40,,,,,,approach
        -20,0,2,,,,straight,120,,,,,,0.2,"nozzle down, wait"
        0,0,2,,,,,60,,,,,axis,,bead begins behind this point
        200,0,2,,,,,,,on,5,1,,,first side
        200,120,2,,,,,,,,,,,0.1,second side
        200,130,2,,,,,120,,off,,,,,off the edge
        200,130,50,,,,,250,,,,,,,clear
        0,0,150,,,,joint,,40,,,,pose,,back

        """;
}
