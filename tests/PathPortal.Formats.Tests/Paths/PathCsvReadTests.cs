using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;
using PathPortal.Formats.Paths;
using PathPortal.Formats.Problems;

namespace PathPortal.Formats.Tests.Paths;

public sealed class PathCsvReadTests
{
    [Fact]
    public void Read_OfTheExample_GivesPointsAndFiguresWithoutRemarks()
    {
        var read = PathCsv.Read(PathExample.Text);

        Assert.Empty(read.Problems);
        Assert.Empty(read.Remarks);
        var report = read.Value!.Report;
        Assert.Equal((9, 6, 2), (report.Points, report.StraightMoves, report.JointMoves));

        // By hand: 48 + 20 + 200 + 120 + 10 + 48 mm straight, 200 + 120 mm of it with the process on.
        Assert.Equal(0.446, report.StraightLength, 1e-12);
        Assert.Equal(0.320, report.ProcessLength, 1e-12);
        Assert.Equal(new Vector3D(-0.02, 0, 0.002), report.Low);
        Assert.Equal(new Vector3D(0.2, 0.13, 0.15), report.High);
    }

    [Fact]
    public void Read_BlankModalCells_RepeatTheRowAbove()
    {
        var points = PathCsv.Read(PathExample.Text).Value!.Path.Waypoints;

        Assert.Equal(MotionKind.Joint, points[1].Motion);
        Assert.Equal(0.4, points[1].JointSpeedShare);
        Assert.Equal(MotionKind.Straight, points[3].Motion);
        Assert.Equal((0.06, TaskKind.Axis, true), (points[5].Speed, points[5].Task, points[5].ProcessOn));
        Assert.Equal((0.001, 0.005, 0.0), (points[4].CornerReach, points[4].LeadIn, points[5].LeadIn));
        Assert.Equal(points[0].Orientation, points[8].Orientation);
        Assert.Equal("nozzle down, wait", points[2].Label);
        Assert.Equal(6, points[2].SourceLine);
    }

    [Fact]
    public void Read_MillimetresAndMetres_GiveTheSameBits()
    {
        var mm = PathCsv.Read("x_mm,y_mm,z_mm,qw,qx,qy,qz,speed_mm_s\n0.1,0.2,123.456,1,0,0,0,33.3\n1e2,-7.7e-1,1.1E1,,,,,\n");
        var m = PathCsv.Read("x_m,y_m,z_m,qw,qx,qy,qz,speed_m_s\n0.0001,0.0002,0.123456,1,0,0,0,0.0333\n0.1,-0.00077,0.011,,,,,\n");

        Assert.Equal(m.Value!.Path.Waypoints.AsEnumerable(), mm.Value!.Path.Waypoints);
    }

    [Theory]
    [InlineData("axis_to_tip_x,axis_to_tip_y,axis_to_tip_z", "0.6,0,-0.8")]
    [InlineData("axis_to_holder_x,axis_to_holder_y,axis_to_holder_z", "-0.6,0,0.8")]
    public void Read_ToolAxis_BecomesTheToolFramesZ(string columns, string axis)
    {
        var read = PathCsv.Read($"x_mm,y_mm,z_mm,{columns},speed_mm_s\n0,0,0,{axis},10\n10,0,0,,,,\n");

        var z = RotationMatrix.FromQuaternion(read.Value!.Path.Waypoints[0].Orientation).AxisZ;
        Assert.Equal(0.6, z.X, 1e-15);
        Assert.Equal(0, z.Y, 1e-15);
        Assert.Equal(-0.8, z.Z, 1e-15);
        Assert.Equal(TaskKind.Axis, read.Value.Path.Waypoints[1].Task);
    }

    [Fact]
    public void Read_ToolAxesAroundTheOppositeDirection_DoNotSpinAboutTheAxis()
    {
        var read = PathCsv.Read(
            "x_mm,y_mm,z_mm,axis_to_tip_x,axis_to_tip_y,axis_to_tip_z,speed_mm_s\n0,0,0,0.01,0,-1,10\n10,0,0,0,0.01,-1,\n20,0,0,-0.01,0,-1,\n30,0,0,0,0,-1,\n");

        // Shortest turns between these axes are about 0.014, 0.014 and 0.01 rad; turns from +z would differ by up to half a turn.
        var points = read.Value!.Path.Waypoints;
        for (var i = 1; i < points.Length; i++)
        {
            var half = Math.Acos(Math.Min(1, Math.Abs(points[i].Orientation.Dot(points[i - 1].Orientation))));
            Assert.InRange(2 * half, 0.009, 0.015);
        }

        var z = RotationMatrix.FromQuaternion(points[3].Orientation).AxisZ;
        Assert.Equal(-1, z.Z, 1e-12);
    }

    [Fact]
    public void Read_FixedXyzAngles_MatchTheReferenceRotation()
    {
        var read = PathCsv.Read(
            "x_mm,y_mm,z_mm,fixed_xyz_1_rad,fixed_xyz_2_rad,fixed_xyz_3_rad,speed_mm_s\n0,0,0,0.3,-0.2,1.1,10\n10,0,0,,,,\n");

        // Roll, pitch, yaw 0.3, -0.2, 1.1 about fixed axes as in the URDF specification, quaternion computed with numpy and Orocos KDL.
        var q = read.Value!.Path.Waypoints[0].Orientation;
        Assert.Equal(0.8309424152086116, q.W, 1e-12);
        Assert.Equal(0.17835891295669043, q.X, 1e-12);
        Assert.Equal(-0.00643555567205396, q.Y, 1e-12);
        Assert.Equal(0.5269548219718452, q.Z, 1e-12);
    }

    [Fact]
    public void Read_MovingZyxAngles_AreTheFixedOnesInReverse()
    {
        var moving = PathCsv.Read("x_mm,y_mm,z_mm,moving_zyx_1_deg,moving_zyx_2_deg,moving_zyx_3_deg,speed_mm_s\n0,0,0,70,-20,15.5,10\n10,0,0,,,,\n");
        var fixedAxes = PathCsv.Read("x_mm,y_mm,z_mm,fixed_xyz_1_deg,fixed_xyz_2_deg,fixed_xyz_3_deg,speed_mm_s\n0,0,0,15.5,-20,70,10\n10,0,0,,,,\n");

        Assert.Equal(1, fixedAxes.Value!.Path.Waypoints[0].Orientation.Dot(moving.Value!.Path.Waypoints[0].Orientation), 1e-15);
    }

    [Fact]
    public void Read_Postures_TakeTheirUnitsFromTheColumnNames()
    {
        var read = PathCsv.Read(
            "x_mm,y_mm,z_mm,qw,qx,qy,qz,motion,j1_mm,j2_deg,j3_deg\n0,0,0,1,0,0,0,joint,,,\n10,0,0,,,,,,250,90,-180\n20,0,0,,,,,,,,\n");

        Assert.Empty(read.Problems);
        Assert.Equal([0.25, Math.PI / 2, -Math.PI], read.Value!.Path.Waypoints[1].Joints!.Value);
        Assert.Null(read.Value.Path.Waypoints[2].Joints);
        Assert.Equal("Prismatic Revolute Revolute", string.Join(' ', read.Value.Report.PostureKinds));
    }

    [Fact]
    public void Read_ByteOrderMarksUtf16AndLineEnds_MakeNoDifference()
    {
        var plain = PathCsv.Read(PathExample.Text).Value!.Path.Waypoints;
        var windows = PathExample.Text.ReplaceLineEndings("\r\n");
        byte[][] sources =
        [
            [.. System.Text.Encoding.UTF8.Preamble, .. System.Text.Encoding.UTF8.GetBytes(windows)],
            [.. System.Text.Encoding.Unicode.Preamble, .. System.Text.Encoding.Unicode.GetBytes(windows)],
            [.. System.Text.Encoding.BigEndianUnicode.Preamble, .. System.Text.Encoding.BigEndianUnicode.GetBytes(PathExample.Text)],
            System.Text.Encoding.UTF8.GetBytes(PathExample.Text.ReplaceLineEndings("\r")),
        ];

        Assert.All(sources, s => Assert.Equal(plain.AsEnumerable(), PathCsv.Read(s).Value!.Path.Waypoints));
    }

    [Theory]
    [InlineData("de-DE")]
    [InlineData("fr-FR")]
    [InlineData("tr-TR")]
    [InlineData("ar-SA")]
    public void Read_UnderAnyCulture_GivesTheSamePathAndTheSameRefusal(string culture)
    {
        const string Bad = "X_MM,Y_MM,Z_MM,QW,QX,QY,QZ,SPEED_MM_S\n\"1,5\",0,0,1,0,0,0,10\n12.5,0,0,,,,,\n";
        var (good, refused) = (PathCsv.Read(PathExample.Text).Value!, PathCsv.Read(Bad).Problems);
        var written = PathCsv.Write(good.Path);
        var before = System.Globalization.CultureInfo.CurrentCulture;
        try
        {
            System.Globalization.CultureInfo.CurrentCulture = new(culture);

            Assert.Equal(good.Path.Waypoints.AsEnumerable(), PathCsv.Read(PathExample.Text).Value!.Path.Waypoints);
            Assert.Equal(refused.AsEnumerable(), PathCsv.Read(Bad).Problems);
            Assert.Equal(refused[0].ToString(), PathCsv.Read(Bad).Problems[0].ToString());
            Assert.Equal(written, PathCsv.Write(good.Path));
        }
        finally
        {
            System.Globalization.CultureInfo.CurrentCulture = before;
        }
    }

    [Fact]
    public async Task ReadAsync_OfAStreamBeyondTheLimit_StopsReadingThere()
    {
        using var source = new EndlessStream();

        var read = await PathCsv.ReadAsync(source, TestContext.Current.CancellationToken);

        Assert.Equal("The file is too large.", Assert.Single(read.Problems).Message);
        Assert.InRange(source.Given, ReadLimits.PathBytes, ReadLimits.PathBytes + 1024 * 1024);
    }

    private sealed class EndlessStream : MemoryStream
    {
        public long Given { get; private set; }

        public override ValueTask<int> ReadAsync(Memory<byte> buffer, CancellationToken cancellationToken = default)
        {
            buffer.Span.Fill((byte)'1');
            Given += buffer.Length;
            return ValueTask.FromResult(buffer.Length);
        }
    }
}
