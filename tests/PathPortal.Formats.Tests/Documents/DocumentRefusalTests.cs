using System.Text;
using PathPortal.Formats.Documents;
using PathPortal.Formats.Problems;

namespace PathPortal.Formats.Tests.Documents;

public sealed class DocumentRefusalTests
{
    private static readonly string Arm = InventedDocuments.Arm().ToJson();
    private static readonly string Criteria = InventedDocuments.Criteria().ToJson();

    // What to replace in the invented arm, with what; then where the problem must be and what it must say.
    [Theory]
    [InlineData("\"a_mm\": 420,", "\"a_mm\": \"420\",", 38, 15, "joints[1].a_mm", "420", "This is not a number.")]
    [InlineData("\"a_mm\": 420,", "\"a_mm\": 1e400,", 38, 15, "joints[1].a_mm", "1e400", "The number is too large.")]
    [InlineData("\"a_mm\": 420,", "\"a_mm\": 420000,", 38, 15, "joints[1].a_mm", "420000", "The number is outside its range.")]
    [InlineData("\"a_mm\": 420,", "\"a_m\": 0.42,", 38, 7, "joints[1].a_m", "a_m", "The property is not known.")]
    [InlineData("\"a_mm\": 420,", "\"a_mm\": 420, \"a_mm\": 420,", 38, 20, "joints[1].a_mm", "a_mm", "The property is written twice.")]
    [InlineData("\"a_mm\": 420,", "\"a_mm\": 420, \"axis\": [0, 0, 1],", 38, 20, "joints[1].axis", "axis", "The property is not known.")]
    [InlineData("\"a_mm\": 420,", "\"a_mm\": NaN,", 38, 15, "", "", "The text is not well-formed JSON here.")]
    [InlineData("\"a_mm\": 420,", "\"a_mm\": 420, // long", 38, 20, "", "", "The text is not well-formed JSON here.")]
    [InlineData("\"dh_standard\"", "\"dh_standart\"", 6, 17, "kinematics", "dh_standart", "This is not a known word.")]
    [InlineData("\"characteristic_length_mm\": 1000", "\"characteristic_length_mm\": 0", 5, 31, "characteristic_length_mm", "0", "The number is outside its range.")]
    [InlineData("\"J2\"", "\"j1\"", 33, 15, "joints[1].name", "j1", "The name is used twice.")]
    [InlineData("\"J2\"", "\"J\\u202E2\"", 33, 15, "joints[1].name", "J\\u202E2", "The text holds a control, direction or other hidden character.")]
    [InlineData("\"J2\"", "\" J2\"", 33, 15, "joints[1].name", " J2", "The text begins or ends with a blank.")]
    [InlineData("\"J2\"", "\"\"", 33, 15, "joints[1].name", "", "The text is missing.")]
    [InlineData("\"J2\"", "\"J\\uD800\"", 33, 15, "", "", "The text is not well-formed JSON here.")]
    [InlineData("\"sign\": 1,\n      \"theta_deg\": 0,\n      \"d_mm\": 0,\n      \"a_mm\": 420", "\"sign\": 0,\n      \"theta_deg\": 0,\n      \"d_mm\": 0,\n      \"a_mm\": 420", 35, 15, "joints[1].sign", "0", "The number is outside its range.")]
    [InlineData("\"sign\": 1,\n      \"theta_deg\": 0,\n      \"d_mm\": 0,\n      \"a_mm\": 420", "\"sign\": 1.5,\n      \"theta_deg\": 0,\n      \"d_mm\": 0,\n      \"a_mm\": 420", 35, 15, "joints[1].sign", "1.5", "This is not a whole number.")]
    [InlineData("\"format\": \"pathportal-arm-1\"", "\"format\": \"pathportal-arm-2\"", 2, 13, "format", "pathportal-arm-2", "The document does not name this format.")]
    [InlineData("\"convention\": \"fixed_xyz\"", "\"convention\": \"quaternion\"", 157, 7, "flange_in_last_frame.orientation.angles_deg", "angles_deg", "The property does not belong to an object of this kind.")]
    public void Read_OfAnArmWithOneFault_NamesPlacePropertyAndFault(
        string part, string replacement, int line, int column, string field, string value, string message)
    {
        var text = Replaced(Arm, part, replacement);

        var problem = ArmDocument.Read(text).Problems.Last();

        Assert.Equal((line, column, field, value, message), (problem.Line, problem.Column, problem.Field, problem.Value, problem.Message));
    }

    [Fact]
    public void Read_WithoutAProperty_NamesItAndTheObjectItBelongsTo()
    {
        var problem = Assert.Single(ArmDocument.Read(Replaced(Arm, "\"a_mm\": 420,\n", "\n")).Problems);

        Assert.Equal((32, 5, "joints[1].a_mm", "A property is missing."), (problem.Line, problem.Column, problem.Field, problem.Message));
    }

    [Fact]
    public void Read_OfLimitsInTheWrongOrder_PointsAtTheHighOne()
    {
        var problem = Assert.Single(ArmDocument.Read(Replaced(Arm, "\"deg\": 170", "\"deg\": -171")).Problems);

        Assert.Equal("joints[0].limits.high.deg", problem.Field);
        Assert.Equal(("-171", "a number above low, -170 deg"), (problem.Value, problem.Expected));
        Assert.Equal("The high limit is not above the low one.", problem.Message);
    }

    [Theory]
    [InlineData("", "The file is empty.")]
    [InlineData("   ", "The text is not well-formed JSON here.")]
    [InlineData("[]", "The document is not an object.")]
    [InlineData("{}", "The document does not name this format.")]
    [InlineData("{\"format\": 1}", "The document does not name this format.")]
    [InlineData("{\"format\": \"pathportal-arm-1\",}", "The text is not well-formed JSON here.")]
    [InlineData("{\"format\": \"pathportal-arm-1\"} {}", "The text is not well-formed JSON here.")]
    [InlineData("PK\u0003\u0004", "This is a ZIP archive or a spreadsheet workbook, not a text file.")]
    [InlineData("{\"a\":{\"a\":{\"a\":{\"a\":{\"a\":{\"a\":{\"a\":{\"a\":{\"a\":{\"a\":{\"a\":{\"a\":{\"a\":{\"a\":{\"a\":{\"a\":{\"a\":1}}}}}}}}}}}}}}}}}", "The text is not well-formed JSON here.")]
    public void Read_OfWhatIsNoDocument_SaysSo(string text, string message) =>
        Assert.Equal(message, Assert.Single(ArmDocument.Read(text).Problems).Message);

    [Fact]
    public void Read_OfATooLargeDocument_IsRefused() =>
        Assert.Equal("The file is too large.", Assert.Single(ArmDocument.Read(new byte[ReadLimits.DocumentBytes + 1]).Problems).Message);

    [Fact]
    public void Read_OfAHundredThousandNestedLists_IsRefused() =>
        Assert.Equal("The text is not well-formed JSON here.", Assert.Single(ArmDocument.Read(new string('[', 100_000)).Problems).Message);

    [Fact]
    public void Read_WithManyFaults_ListsFiftyAndCountsTheRest()
    {
        var unknown = string.Join(", ", Enumerable.Range(0, 80).Select(i => $"\"extra_{i}\": 1"));
        var read = CriteriaDocument.Read(Replaced(Criteria, "\"singularity_binds\": true", "\"singularity_binds\": true, " + unknown));

        Assert.Equal((50, 30, "and 30 more"), (read.Problems.Length, read.ProblemsNotListed, read.MoreText));
        Assert.Null(read.Value);
    }

    [Theory]
    [InlineData("\"joint_speed\": 85", "\"joint_sped\": 85", "near_percent.joint_sped", "This is not a criterion with a limit.")]
    [InlineData("\"joint_speed\": 85", "\"finished\": 85", "near_percent.finished", "This is not a criterion with a limit.")]
    [InlineData("\"joint_speed\": 85", "\"joint_speed\": 101", "near_percent.joint_speed", "The number is outside its range.")]
    [InlineData("\"speed_share_percent\": 90", "\"speed_share_percent\": 0", "speed_share_percent", "The number is outside its range.")]
    [InlineData("\"revolute_clearance_deg\": 3", "\"revolute_clearance_deg\": 0", "revolute_clearance_deg", "The number is outside its range.")]
    [InlineData("\"singularity_binds\": true", "\"singularity_binds\": \"yes\"", "singularity_binds", "This is neither true nor false.")]
    [InlineData("\"across_tolerance_mm\": 0.5", "\"across_tolerance_mm\": null", "across_tolerance_mm", "This is not a number.")]
    public void Read_OfACriteriaSheetWithOneFault_NamesIt(string part, string replacement, string field, string message)
    {
        var problem = Assert.Single(CriteriaDocument.Read(Replaced(Criteria, part, replacement)).Problems);

        Assert.Equal((field, message), (problem.Field, problem.Message));
        Assert.True(problem.Line > 1);
    }

    [Fact]
    public void Validate_OfAForm_NamesFieldValueAndUnit()
    {
        var setup = InventedDocuments.Setup();
        setup.Controller.PeriodMs = 0;
        setup.Controller.PositionGainPerS = double.NaN;
        setup.Tools[1].Name = "Nozzle";
        setup.Frames[0].Pose.Orientation.Convention = "roll";

        var problems = setup.Validate();

        Assert.Equal(
            ["controller.period_ms", "controller.position_gain_per_s", "frames[0].pose_in_cell.orientation.convention", "tools[1].name"],
            problems.Select(p => p.Field).Order(StringComparer.Ordinal));
        Assert.Equal("controller.period_ms: The number is outside its range. Found “0”. Expected a number above 0 to 100 ms.", problems.First(p => p.Field.EndsWith("period_ms", StringComparison.Ordinal)).ToString());
        Assert.Throws<InvalidOperationException>(() => setup.ToCellGeometry("nozzle", "fixture A"));
        Assert.Throws<InvalidOperationException>(() => setup.ToJson());
    }

    [Fact]
    public void ToCellGeometry_WithAnUnknownTool_NamesIt()
    {
        var error = Assert.Throws<InvalidOperationException>(() => InventedDocuments.Setup().ToCellGeometry("brush", "fixture A"));

        Assert.Equal("The setup has no tool named “brush”.", error.Message);
    }

    [Theory]
    [InlineData(1, 2, "unlike")]
    [InlineData(0, 0, "zero quaternion")]
    public void Validate_OfAQuaternion_NeedsADirection(double w, double x, string what)
    {
        var arm = InventedDocuments.FramesArm();
        arm.Flange.Orientation = new() { Convention = OrientationConvention.Quaternion, W = w, X = x };

        Assert.Equal(what == "zero quaternion", arm.Validate().Any(p => p.Message == "The quaternion has no direction."));
    }

    [Fact]
    public void Read_OfUtf16WithItsMark_IsTakenAndWithoutItIsRefused()
    {
        byte[] marked = [.. Encoding.Unicode.Preamble, .. Encoding.Unicode.GetBytes(Arm)];

        Assert.Equal(Arm, ArmDocument.Read(marked).Value!.ToJson());
        Assert.Equal("The text looks like UTF-16 without a byte order mark.", Assert.Single(ArmDocument.Read(marked.AsSpan(2)).Problems).Message);
    }

    private static string Replaced(string text, string part, string replacement)
    {
        var at = text.IndexOf(part, StringComparison.Ordinal);
        Assert.True(at >= 0, $"The text has no {part}.");
        return text[..at] + replacement + text[(at + part.Length)..];
    }
}
