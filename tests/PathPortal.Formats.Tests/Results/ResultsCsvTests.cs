using System.Globalization;
using PathPortal.Engine;
using PathPortal.Engine.Verdicts;
using PathPortal.Formats.Paths;
using PathPortal.Formats.Results;
using PathPortal.Formats.Tests.Documents;

namespace PathPortal.Formats.Tests.Results;

public sealed class ResultsCsvTests
{
    [Fact]
    public void Write_OfSamples_GivesUnitsInTheHeaderAndEscapedLabels()
    {
        var rows = Written();

        Assert.Equal(4, rows.Length);
        Assert.Equal("", rows[3]);
        var (header, first, second) = (rows[0].Split(','), rows[1].Split(','), rows[2].Split(','));
        Assert.Equal(header.Length, first.Length);
        Assert.Equal(header.Distinct().Count(), header.Length);
        Assert.All(
            header.Except(["source_line", "label", "process", "sigma_min", "sigma_max", "damping_squared", "speed_scale", "path_scale"]).Where(h => !h.Contains("_q", StringComparison.Ordinal)),
            h => Assert.Matches("_(s|s2|mm|deg|percent)$", h));
        Assert.Equal("'=cmd()", first[Array.IndexOf(header, "label")]);
        Assert.Equal("5", first[Array.IndexOf(header, "j1_mm")]);
        Assert.Equal(180, double.Parse(first[Array.IndexOf(header, "j2_deg")], CultureInfo.InvariantCulture), 1e-12);
        Assert.Equal("0.3", second[Array.IndexOf(header, "tracking_error_mm")]);
        Assert.Equal(("", "inf"), (first[Array.IndexOf(header, "use_joint_speed_percent")], second[Array.IndexOf(header, "use_joint_speed_percent")]));
        Assert.Equal("0.004", second[Array.IndexOf(header, "time_s")]);
    }

    [Theory]
    [InlineData("de-DE")]
    [InlineData("ar-SA")]
    public void Write_UnderAnyCulture_GivesTheSameText(string culture)
    {
        var expected = Written();
        var before = CultureInfo.CurrentCulture;
        try
        {
            CultureInfo.CurrentCulture = new(culture);

            Assert.Equal(expected, Written());
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }

    private static string[] Written()
    {
        var path = PathCsv.Read("x_mm,y_mm,z_mm,qw,qx,qy,qz,speed_mm_s,label\n0,0,0,1,0,0,0,10,'=cmd()\n10,0,0,,,,,,second\n").Value!.Path;
        double[] zero = [0, 0], one = [1, 1];
        var samples = new RunSamples
        {
            Count = 2,
            JointCount = 2,
            Period = 0.004,
            ReferenceTime = [0, 0.004],
            PathFraction = [0, 1],
            Waypoint = [0, 1],
            Process = [false, true],
            Joints = [[0.005, 0.006], [Math.PI, -1]],
            JointSpeeds = [zero, zero],
            JointSpeedDemands = [zero, zero],
            JointAccelerationDemands = [zero, zero],
            ReferencePosition = [zero, zero, zero],
            ReferenceOrientation = [one, zero, zero, zero],
            ToolPosition = [zero, zero, zero],
            ToolOrientation = [one, zero, zero, zero],
            TrackingError = [0, 0.0003],
            TurnError = zero,
            AcrossPath = [double.NaN, 0],
            StandOff = [double.NaN, 0],
            ToolAxisAngle = [double.NaN, 0],
            ToolSpeed = zero,
            ReferenceSpeed = zero,
            SigmaMin = one,
            SigmaMax = one,
            DampingSquared = zero,
            SpeedScale = one,
            PathScale = one,
        };

        // Only the engine sets the uses; a test of the writer needs some.
        var uses = new Dictionary<Criterion, double[]> { [Criterion.JointSpeed] = [double.NaN, double.PositiveInfinity] };
        typeof(RunSamples).GetProperty(nameof(RunSamples.Use))!.SetValue(samples, uses);
        using var writer = new StringWriter(CultureInfo.GetCultureInfo("de-DE"));
        ResultsCsv.Write(writer, samples, InventedDocuments.FramesArm().ToArmModel(), path);
        return writer.ToString().Split("\r\n");
    }
}
