using System.Text;
using PathPortal.Formats.Paths;
using PathPortal.Formats.Problems;

namespace PathPortal.Formats.Tests.Paths;

public sealed class PathCsvRefusalTests
{
    private const string Q = "x_mm,y_mm,z_mm,qw,qx,qy,qz,speed_mm_s";

    [Theory]
    [InlineData(Q + "\n0,0,0,1,0,0,0,10\n10,abc,0,,,,,\n", 3, 4, "y_mm", "abc", "This is not a number.")]
    [InlineData(Q + "\n0,0,0,1,0,0,0,10\n10, NaN,0,,,,,\n", 3, 5, "y_mm", "NaN", "The value is not a finite number.")]
    [InlineData(Q + "\n0,0,0,1,0,0,0,10\n10,-Infinity,0,,,,,\n", 3, 4, "y_mm", "-Infinity", "The value is not a finite number.")]
    [InlineData(Q + "\n0,0,0,1,0,0,0,10\n10,1e400,0,,,,,\n", 3, 4, "y_mm", "1e400", "The number is too large.")]
    [InlineData(Q + "\n0,0,0,1,0,0,0,10\n\"1,5\",0,0,,,,,\n", 3, 1, "x_mm", "1,5", "The number has a comma; only a decimal point is read, and no thousands marks.")]
    [InlineData(Q + "\n0,0,0,1,0,0,0,10\n10,,0,,,,,\n", 3, 4, "y_mm", "", "The coordinate is missing.")]
    [InlineData(Q + "\n0,0,0,1,0,0,0,10\n100001,0,0,,,,,\n", 3, 1, "x_mm", "100001", "The number is outside its range.")]
    [InlineData(Q + "\n0,0,0,1,0,0,0,10\n10,0x10,0,,,,,\n", 3, 4, "y_mm", "0x10", "This is not a number.")]
    [InlineData(Q + "\n0,0,0,1,0,0,0,10\n10,1_000,0,,,,,\n", 3, 4, "y_mm", "1_000", "This is not a number.")]
    [InlineData(Q + "\n0,0,0,1,0,0,0,10\n10,\u0661,0,,,,,\n", 3, 4, "y_mm", "\u0661", "This is not a number.")]
    [InlineData(Q + "\n0,0,0,0,0,0,0,10\n10,0,0,,,,,\n", 2, 7, "qw", "0", "The quaternion is zero, so it has no direction.")]
    [InlineData(Q + "\n0,0,0,1,1,0,0,10\n10,0,0,,,,,\n", 2, 7, "qw", "1", "The quaternion has the norm 1.414; it is no rotation.")]
    [InlineData(Q + "\n0,0,0,1,,0,0,10\n10,0,0,,,,,\n", 2, 9, "qx", "", "The orientation is not complete.")]
    [InlineData(Q + "\n0,0,0,,,,,10\n10,0,0,1,0,0,0,\n", 2, 7, "qw", "", "The first row has no orientation.")]
    [InlineData(Q + "\n0,0,0,1,0,0,0,10\n0,0,0,,,,,\n", 3, 1, "x_mm", "0", "The point is the same as that of line 2.")]
    [InlineData(Q + "\n0,0,0,1,0,0,0,10\n0,0,0,-1,0,0,0,\n", 3, 1, "x_mm", "0", "The point is the same as that of line 2.")]
    [InlineData(Q + "\n0,0,0,1,0,0,0,10\n", 2, 0, "", "", "The path has only one point.")]
    [InlineData(Q + "\n", 0, 0, "", "", "The path has no points.")]
    [InlineData("", 1, 1, "", "", "The file holds no lines.")]
    [InlineData("# nothing but a remark\n\n", 1, 1, "", "", "The file holds no lines.")]
    [InlineData(Q + "\n0,0,0,1,0,0,0,10\n10,0,0,,,,\n", 3, 11, "", "", "The row has 7 cells.")]
    [InlineData(Q + "\n0,0,0,1,0,0,0,10\n10,0,0,,,,,,7\n", 3, 13, "", "7", "The row has 9 cells.")]
    [InlineData(Q + "\n1,5,0,0,1,0,0,0,0,10\n10,0,0,,,,,\n", 2, 17, "", "0", "The row has 10 cells. Decimal commas split a number in two: write points.")]
    [InlineData(Q + "\n0,0,0,1,0,0,0,10\n10,\"0,0,,,,,\n20,0,0,,,,,\n", 3, 4, "", "0,0,,,,,\\u000A20,0,0,,,,,\\u000A", "A quote is opened and never closed.")]
    [InlineData(Q + "\n0,0,0,1,0,0,0,10\n10,\"0\"1,0,,,,,\n", 3, 4, "", "0", "Text follows a closing quote.")]
    [InlineData(Q + "\n0,0,0,1,0,0,0,10\n10,0\"1,0,,,,,\n", 3, 4, "", "0\"1", "A quote stands inside a cell that does not begin with one.")]
    [InlineData(Q + "\n0,0,0,1,0,0,0,\n10,0,0,,,,,\n", 3, 12, "speed_mm_s", "", "A straight move has no speed.")]
    [InlineData(Q + "\n0,0,0,1,0,0,0,0\n10,0,0,,,,,\n", 2, 15, "speed_mm_s", "0", "The number is outside its range.")]
    [InlineData("x_mm,y_mm,z_mm,qw,qx,qy,qz\n0,0,0,1,0,0,0\n10,0,0,,,,\n20,0,0,,,,\n", 3, 1, "", "", "A straight move has no speed: there is no speed column.")]
    public void Read_OfOneFault_NamesLineColumnValueAndFault(string file, int line, int column, string field, string value, string message)
    {
        var problem = PathCsv.Read(file).Problems[0];

        Assert.Equal((line, column, field, value, message), (problem.Line, problem.Column, problem.Field, problem.Value, problem.Message));
        Assert.NotEmpty(problem.Expected);
    }

    [Theory]
    [InlineData("x_mm,y_mm,z_mm,qw,qx,qy,qz,sped_mm_s", 28, "sped_mm_s", "The column is not known.", "nearest is “speed_mm_s”")]
    [InlineData("x_mm,y_mm,z_mm,qw,qx,qy,qz,", 28, "", "A column has no name.", "a known column")]
    [InlineData("x_mm,y_mm,z_mm,qw,qx,qy,qz,QX", 28, "QX", "The column is there twice.", "each column once")]
    [InlineData("x_mm,y_mm,z_mm,qw,qx,qy,qz,speed_mm_s,speed_m_s", 39, "speed_m_s", "The same quantity is given in two units.", "“speed_mm_s” is there already")]
    [InlineData("x_mm,y_m,z_mm,qw,qx,qy,qz", 6, "y_m", "Columns of one quantity differ in unit or convention.", "the unit or convention of “x_mm”")]
    [InlineData("x_mm,y_mm,qw,qx,qy,qz", 1, "x_mm", "Columns that belong to this one are missing.", "x_mm, y_mm, z_mm")]
    [InlineData("qw,qx,qy,qz", 1, "", "The position columns are missing.", "x_mm, y_mm, z_mm")]
    [InlineData("x_mm,y_mm,z_mm,speed_mm_s", 1, "", "The orientation columns are missing.", "qw, qx, qy, qz")]
    [InlineData("x_mm,y_mm,z_mm,qw,qx,qy,qz,axis_to_tip_x,axis_to_tip_y,axis_to_tip_z", 28, "axis_to_tip_x", "The orientation is given in two ways.", "one way")]
    [InlineData("x_mm,y_mm,z_mm,qw,qx,qy", 16, "qw", "Columns that belong to this one are missing.", "every part of the orientation")]
    [InlineData("x_mm,y_mm,z_mm,fixed_xyz_1_deg,moving_xyz_2_deg,fixed_xyz_3_deg", 32, "moving_xyz_2_deg", "Columns of one quantity differ in unit or convention.", "“fixed_xyz_1_deg”")]
    [InlineData("x_mm,y_mm,z_mm,fixed_xyz_1_deg,fixed_xyz_2_rad,fixed_xyz_3_deg", 32, "fixed_xyz_2_rad", "Columns of one quantity differ in unit or convention.", "“fixed_xyz_1_deg”")]
    [InlineData("x_mm,y_mm,z_mm,qw,qx,qy,qz,j1_deg,j3_deg", 28, "j1_deg", "Columns that belong to this one are missing.", "without gaps")]
    [InlineData("x_mm,y_mm,z_mm,qw,qx,qy,qz,j1_deg,j2_rad", 35, "j2_rad", "Columns of one quantity differ in unit or convention.", "“j1_deg”")]
    [InlineData("x_mm;y_mm;z_mm;qw;qx;qy;qz", 5, ";", "The cells are separated by semicolons.", "commas between cells")]
    [InlineData("x_mm\ty_mm\tz_mm", 5, "\\u0009", "The cells are separated by tabs.", "commas between cells")]
    [InlineData("0,0,0,1,0,0,0,10", 1, "0", "The first line holds no column names.", "a header line")]
    [InlineData("<svg/>", 1, "<svg/>", "This looks like XML or JSON, not like a path file.", "a header line")]
    [InlineData("{\"x\": 1}", 1, "{\"x\": 1}", "This looks like XML or JSON, not like a path file.", "a header line")]
    [InlineData("x_mm,y_mm,z_mm,qw,qx,qy,\"qz", 25, "qz\\u000A0,0,0,1,0,0,0\\u000A", "A quote is opened and never closed.", "a closing quote")]
    [InlineData("x_mm,y_mm,z_mm,qw,qx,qy,qz,\u0130abel", 28, "\u0130abel", "The column is not known.", "nearest is “label”")]
    public void Read_OfAFaultyHeader_NamesTheColumn(string header, int column, string value, string message, string expected)
    {
        var problem = PathCsv.Read(header + "\n0,0,0,1,0,0,0\n").Problems[0];

        Assert.Equal((1, column, value, message), (problem.Line, problem.Column, problem.Value, problem.Message));
        Assert.Contains(expected, problem.Expected, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("motion", "straigt", 3, 17, "This word is not known here.")]
    [InlineData("process", "yes", 3, 17, "This word is not known here.")]
    [InlineData("task", "six", 3, 17, "This word is not known here.")]
    [InlineData("dwell_s", "-1", 3, 17, "The number is outside its range.")]
    [InlineData("dwell_s", "3601", 3, 17, "The number is outside its range.")]
    [InlineData("corner_mm", "-1", 3, 17, "The number is outside its range.")]
    [InlineData("corner_mm", "6", 3, 17, "Corner roundings overlap: the straight to or from line 4 is 5 mm long, 0 mm of it already taken.")]
    [InlineData("joint_speed_percent", "101", 3, 17, "The number is outside its range.")]
    [InlineData("label", "a\u202Eb", 3, 17, "The label holds a control, direction or other hidden character.")]
    [InlineData("label", "a\u0007b", 3, 17, "The label holds a control, direction or other hidden character.")]
    [InlineData("label", "\"two\nlines\"", 3, 17, "The label holds a control, direction or other hidden character.")]
    [InlineData("j1_deg", "12", 3, 17, "A posture is given for a straight move; only joint moves end in a posture.")]
    [InlineData("j1_deg", "40000", 3, 17, "The number is outside its range.")]
    public void Read_OfOneWrongSetting_NamesIt(string column, string cell, int line, int at, string message)
    {
        var problem = Assert.Single(PathCsv.Read($"{Q},{column}\n0,0,0,1,0,0,0,10,\n10,0,0,1,0,0,0,,{cell}\n15,0,0,,,,,,\n").Problems);

        Assert.Equal((line, at, column, message), (problem.Line, problem.Column, problem.Field, problem.Message));
    }

    [Fact]
    public void Read_OfALabelThatIsTooLong_SaysTheLimit()
    {
        var problem = Assert.Single(PathCsv.Read($"{Q},label\n0,0,0,1,0,0,0,10,{new string('a', 201)}\n10,0,0,,,,,,\n").Problems);

        Assert.Equal(("The label is too long.", "at most 200 characters"), (problem.Message, problem.Expected));
        Assert.Equal(61, problem.Value.Length);
    }

    [Theory]
    [InlineData("0,0,0,1,0,0,0,joint,,,on", "10,0,0,,,,,,,,", 3, 15, "process", "The process is on during a joint move; joint moves are for moves in air.")]
    [InlineData("0,0,0,1,0,0,0,joint,,,", "10,0,0,,,,,,2,,", 3, 13, "corner_mm", "A corner is rounded only between two straight moves.")]
    [InlineData("0,0,0,1,0,0,0,straight,,,", "10,0,0,,,,,,2,1,", 3, 13, "corner_mm", "The tool cannot wait at a corner it does not stop in.")]
    [InlineData("0,0,0,1,0,0,0,straight,,,", "0,0,0,0,1,0,0,,2,,", 3, 16, "corner_mm", "Corner roundings overlap: the straight to or from line 2 is 0 mm long, 0 mm of it already taken.")]
    public void Read_OfSettingsThatContradict_NamesTheRow(string first, string second, int line, int column, string field, string message)
    {
        var read = PathCsv.Read($"x_mm,y_mm,z_mm,qw,qx,qy,qz,motion,corner_mm,dwell_s,process,speed_mm_s\n{first},10\n{second},\n20,0,0,,,,,,,,,\n");

        Assert.Equal((line, column, field, message), (read.Problems[0].Line, read.Problems[0].Column, read.Problems[0].Field, read.Problems[0].Message));
    }

    [Fact]
    public void Read_OfRoundingsThatOverlapBetweenThem_NamesTheSecond()
    {
        var problem = Assert.Single(PathCsv.Read($"{Q},corner_mm\n0,0,0,1,0,0,0,10,\n50,0,0,,,,,,6\n60,0,0,,,,,,5\n90,0,0,,,,,,\n").Problems);

        Assert.Equal((4, 13, "at most 4 mm"), (problem.Line, problem.Column, problem.Expected));
    }

    [Fact]
    public void Read_OfACornerThatTurnsBack_IsRefused()
    {
        var problem = Assert.Single(PathCsv.Read($"{Q},corner_mm\n0,0,0,1,0,0,0,10,\n50,0,0,,,,,,6\n0,1,0,,,,,,\n").Problems);

        // By hand: 180° less the arc tangent of 1/50.
        Assert.Equal((3, 13, "The path turns by 178.9 degrees here, too sharp to round (at most 170)."), (problem.Line, problem.Column, problem.Message));
    }

    [Theory]
    [InlineData("fixed_xyz_1_rad,fixed_xyz_2_rad,fixed_xyz_3_rad", "90,0,0", 8, "90")]
    [InlineData("fixed_xyz_1_deg,fixed_xyz_2_deg,fixed_xyz_3_deg", "0,721,0", 10, "721")]
    [InlineData("axis_to_tip_x,axis_to_tip_y,axis_to_tip_z", "0,0,0", 8, "0")]
    public void Read_OfAnImpossibleOrientation_NamesIt(string columns, string cells, int column, string value)
    {
        var problem = Assert.Single(PathCsv.Read($"x_mm,y_mm,z_mm,{columns},speed_mm_s\n0,0,0,0,0,1,10\n10,0,0,{cells},\n").Problems);

        Assert.Equal((3, column, value), (problem.Line, problem.Column, problem.Value));
    }

    [Fact]
    public void Read_OfTooManyPoints_StopsAtTheLimit()
    {
        var file = new StringBuilder(Q + "\n0,0,0,1,0,0,0,10\n");
        for (var i = 1; i <= ReadLimits.PathPoints; i++)
        {
            file.Append(System.Globalization.CultureInfo.InvariantCulture, $"{i % 1000},{i / 1000},0,,,,,\n");
        }

        var problem = Assert.Single(PathCsv.Read(file.ToString()).Problems);

        Assert.Equal((200_002, "at most 200,000 points", "The path has too many points."), (problem.Line, problem.Expected, problem.Message));
    }

    [Fact]
    public void Read_OfAFileFullOfFaults_StopsAndSaysSo()
    {
        var read = PathCsv.Read(Q + "\n" + string.Concat(Enumerable.Repeat("a,b,c,d,e,f,g,h\n", 100_000)));

        Assert.Equal((50, true), (read.Problems.Length, read.Stopped));
        Assert.StartsWith("and at least 9", read.MoreText, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(new byte[] { 0x50, 0x4B, 3, 4, 20, 0 }, "This is a ZIP archive or a spreadsheet workbook, not a text file.", 1, 1)]
    [InlineData(new byte[] { 0x1F, 0x8B, 8, 0 }, "This is a gzip archive, not a text file.", 1, 1)]
    [InlineData(new byte[] { 0x78, 0, 0x5F, 0, 0x6D, 0 }, "The text looks like UTF-16 without a byte order mark.", 1, 2)]
    [InlineData(new byte[] { 0x78, 0x5F, 0x6D, 0x0A, 0x6D, 0 }, "A zero byte: this is a binary file, not text.", 2, 2)]
    [InlineData(new byte[] { 0x78, 0x0A, 0xC3, 0xA4, 0xE4, 0x2C }, "A byte that is not UTF-8; the file may be in an older code page.", 2, 2)]
    [InlineData(new byte[] { 0xFF, 0xFE, 0, 0, 0x78, 0, 0, 0 }, "The text is UTF-32.", 1, 1)]
    [InlineData(new byte[] { 0xFF, 0xFE, 0x78, 0, 0, 0xD8, 0x78, 0 }, "The text announces UTF-16 but is not valid UTF-16.", 0, 0)]
    public void Read_OfWhatIsNoText_SaysWhatItIs(byte[] file, string message, int line, int column)
    {
        var problem = Assert.Single(PathCsv.Read(file).Problems);

        Assert.Equal((message, line, column), (problem.Message, problem.Line, problem.Column));
    }

    [Fact]
    public void Read_ColumnsBehindWideCharacters_AreCountedInCharacters()
    {
        var problem = Assert.Single(PathCsv.Read("label," + Q + "\nNaht ä 1 😀,0,0,x,1,0,0,0,10\nb,10,0,0,,,,,\n").Problems);

        // The emoji counts two, as editors count: 11 for the label, five for what follows up to the x.
        Assert.Equal((2, 17, "z_mm"), (problem.Line, problem.Column, problem.Field));
    }
}
