using PathPortal.Engine.Geometry;
using PathPortal.Engine.Tests.Published;

namespace PathPortal.Engine.Tests.Geometry;

public sealed class FrameTests
{
    [Fact]
    public void FromAxis_TiltedAxis_IsTheShortestTurn()
    {
        // R = I + [w]× + [w]×²/(1 + c), w = z × axis, for axis (0, 0.6, 0.8): closed form of geometry.
        Approximately.Equal(
            new RotationMatrix(1, 0, 0, 0, 0.8, 0.6, 0, -0.6, 0.8), ToolAxisFrame.FromAxis(new(0, 0.6, 0.8)), 1e-15, "shortest turn");
    }

    [Fact]
    public void FromAxis_AnyLength_HasTheAxisAsZAndTheSmallestAngle() => Seeded.Cases(500, random =>
    {
        var axis = random.Direction();
        var frame = ToolAxisFrame.FromAxis(random.Between(0.1, 50) * axis);

        Approximately.Equal(axis, frame.AxisZ, 1e-14, "z");
        Approximately.Equal(Math.Acos(Math.Clamp(axis.Z, -1, 1)), RotationVector.Of(frame).Norm, 1e-7, "angle; acos near ±1 is good to 1e-8");
    });

    [Theory]
    [InlineData(0, 0, -1)]
    [InlineData(1, 0, 0)]
    [InlineData(0, -1, 0)]
    public void FromAxis_CoordinateAxis_IsExact(double x, double y, double z)
    {
        var frame = ToolAxisFrame.FromAxis(new(x, y, z));

        Assert.Equal(new Vector3D(x, y, z), frame.AxisZ);
        Assert.Equal(RotationMatrix.Identity, frame.Transposed() * frame);
    }

    [Fact]
    public void ShortestTurn_OppositeAndNearlyOpposite_TurnsTheVector() => Seeded.Cases(200, random =>
    {
        var from = random.Direction();
        foreach (var tilt in new[] { 0, 1e-9, 1e-7, 1e-5, 1e-3 })
        {
            var to = (-from + tilt * random.Direction()).Normalised();
            var turned = RotationMatrix.FromQuaternion(ToolAxisFrame.ShortestTurn(from, to)) * from;

            // Within 1e-7 rad of opposite the axis of the turn is chosen and the vector misses by as much; just beyond, rounding costs 1e-9.
            Approximately.Equal(to, turned, tilt < 1e-3 ? 1.01e-7 : 1e-9, $"tilt {tilt}");
        }
    });

    [Fact]
    public void AtPoint_OffsetPoint_AddsTheCrossProduct()
    {
        var published = PublishedCase.Get("JAC-08");
        var twist = new Twist(
            PublishedArm.Vector(published.Inputs.GetProperty("v_flange")), PublishedArm.Vector(published.Inputs.GetProperty("omega")));

        Approximately.Equal(
            PublishedArm.Vector(published.Expected.GetProperty("v_tool")),
            twist.AtPoint(PublishedArm.Vector(published.Inputs.GetProperty("r"))).Linear,
            published.Tolerance,
            published.Source);
    }

    [Fact]
    public void FromDegrees_RightAngles_AreExact()
    {
        Assert.Equal((1.0, 0.0), (Angle.FromDegrees(90).Sin, Angle.FromDegrees(90).Cos));
        Assert.Equal((-1.0, 0.0), (Angle.FromDegrees(-90).Sin, Angle.FromDegrees(-90).Cos));
        Assert.Equal((0.0, -1.0), (Angle.FromDegrees(-540).Sin, Angle.FromDegrees(-540).Cos));
        Assert.Equal((0.0, 1.0), (Angle.FromDegrees(720).Sin, Angle.FromDegrees(720).Cos));
    }

    [Fact]
    public void FromRadians_RoundedRightAngle_IsNotSnapped()
    {
        // URDF-03: text "1.57" misses the right angle by 7.96e-4 rad, "1.5708" by 3.67e-6 rad.
        foreach (var row in PublishedCase.Get("URDF-03").Expected.GetProperty("rows").EnumerateArray().Take(3))
        {
            var written = double.Parse(row[0].GetString()!, System.Globalization.CultureInfo.InvariantCulture);

            Approximately.Equal(row[1].GetDouble(), Math.Abs(Angle.FromRadians(written).Cos), 1e-9, row[0].GetString()!);
        }
    }
}
