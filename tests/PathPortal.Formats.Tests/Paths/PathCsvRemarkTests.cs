using PathPortal.Formats.Paths;

namespace PathPortal.Formats.Tests.Paths;

public sealed class PathCsvRemarkTests
{
    [Theory]
    [InlineData("x_mm,y_mm,z_mm,qw,qx,qy,qz,speed_mm_s", "0,0,0,1,0,0,0,100", "1.2,0.4,0,,,,,", "No coordinate is larger than 1.2 mm. Are these metres?")]
    [InlineData("x_m,y_m,z_m,qw,qx,qy,qz,speed_m_s", "0,0,0,1,0,0,0,1", "12,0.4,0,,,,,", "Coordinates reach 12 m. Are these millimetres?")]
    [InlineData("x_mm,y_mm,z_mm,qw,qx,qy,qz,speed_mm_s", "0,0,0,1,0,0,0,0.25", "120,0,0,,,,,", "No speed is above 0.25 mm/s. Are these metres per second?")]
    [InlineData("x_mm,y_mm,z_mm,qw,qx,qy,qz,speed_m_s", "0,0,0,1,0,0,0,20", "120,0,0,,,,,", "Speeds run from 20 to 20 m/s. Is the unit right?")]
    [InlineData("x_mm,y_mm,z_mm,fixed_xyz_1_deg,fixed_xyz_2_deg,fixed_xyz_3_deg,speed_mm_s", "0,0,0,3.1416,0,0,100", "120,0,0,,,,", "No angle is larger than 3.1416 degrees. Are these radians?")]
    [InlineData("x_mm,y_mm,z_mm,fixed_xyz_1_rad,fixed_xyz_2_rad,fixed_xyz_3_rad,speed_mm_s", "0,0,0,10,0,0,100", "120,0,0,,,,", "Angles reach 10 rad, more than one turn. Are these degrees?")]
    [InlineData("x_mm,y_mm,z_mm,qw,qx,qy,qz,speed_mm_s", "0,0,0,0.95,0,0,0,100", "120,0,0,,,,,", "1 quaternion(s) have a norm that differs from 1 by more than 0.001, this one first; they were scaled to 1.")]
    [InlineData("x_mm,y_mm,z_mm,qw,qx,qy,qz,motion", "0,0,0,1,0,0,0,joint", "120,0,0,,,,,", "No joint speed is given: joint moves use 50 % of the joint speed limits.")]
    [InlineData("x_mm,y_mm,z_mm,qw,qx,qy,qz,corner_mm,speed_mm_s", "0,0,0,1,0,0,0,5,100", "120,0,0,,,,,,", "The path starts here: the corner is not rounded.")]
    [InlineData("x_mm,y_mm,z_mm,qw,qx,qy,qz,lead_in_mm,speed_mm_s", "0,0,0,1,0,0,0,,100", "120,0,0,,,,,5,", "No process section begins with this row: the lead-in is ignored.")]
    [InlineData("x_mm,y_mm,z_mm,qw,qx,qy,qz,lead_in_mm,speed_mm_s,process", "0,0,0,1,0,0,0,,100,on", "120,0,0,,,,,120,,", "The lead-in is as long as the whole process section: nothing of it will be judged.")]
    [InlineData("x_mm,y_mm,z_mm,qw,qx,qy,qz,speed_mm_s", "0,0,0,1,0,0,0,100", "120,0,0,,,,,", "The process is never on: criteria about the process have nothing to judge.")]
    public void Read_OfWhatLooksMistaken_IsAcceptedWithARemark(string header, string first, string second, string remark)
    {
        var read = PathCsv.Read($"{header}\n{first}\n{second}\n");

        Assert.True(read.Ok);
        Assert.Contains(read.Remarks, r => r.Message == remark);
    }

    [Fact]
    public void Read_OfAPoseTaskByToolAxis_SaysTheTurnWasChosen()
    {
        var read = PathCsv.Read("x_mm,y_mm,z_mm,axis_to_tip_x,axis_to_tip_y,axis_to_tip_z,speed_mm_s,task\n0,0,0,0,0,-1,100,pose\n100,0,0,,,,,\n");

        Assert.Contains(read.Remarks, r => r.Line == 3 && r.Field == "task");
    }

    [Theory]
    [InlineData("0,0,0,0.9998,0,0,0.02,100,on")]
    [InlineData("0,0,0,1,0,0,0,100,on")]
    public void Read_OfRoundedQuaternions_SaysNothing(string first) =>
        Assert.Empty(PathCsv.Read($"x_mm,y_mm,z_mm,qw,qx,qy,qz,speed_mm_s,process\n{first}\n120,0,0,,,,,,\n").Remarks);
}
