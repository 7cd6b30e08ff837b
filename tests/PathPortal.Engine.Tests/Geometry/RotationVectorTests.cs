using System.Globalization;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Tests.Published;

namespace PathPortal.Engine.Tests.Geometry;

public sealed class RotationVectorTests
{
    // rad; a rotation matrix carries its angle to a few roundings.
    private const double AngleTolerance = 1e-14;

    [Theory]
    [InlineData("30")]
    [InlineData("90")]
    [InlineData("170")]
    public void Of_RotationAboutObliqueAxis_IsAngleTimesAxis(string degrees)
    {
        var published = PublishedCase.Get("JAC-12");
        var expected = PublishedArm.Vector(published.Expected.GetProperty(degrees).GetProperty("log"));
        var rotation = RotationVector.ToMatrix(
            double.Parse(degrees, CultureInfo.InvariantCulture) * Math.PI / 180 * PublishedArm.Vector(published.Inputs.GetProperty("axis")));

        Approximately.Equal(expected, RotationVector.Of(rotation), published.Tolerance, published.Source);
        var vectorPart = UnitQuaternion.FromMatrix(rotation);
        Approximately.Equal(
            PublishedArm.Vector(published.Expected.GetProperty(degrees).GetProperty("quaternion_vector_part")),
            new Vector3D(vectorPart.X, vectorPart.Y, vectorPart.Z),
            published.Tolerance,
            published.Source);
    }

    [Fact]
    public void Of_HalfTurn_FindsAxisUpToSign()
    {
        var published = PublishedCase.Get("JAC-13");
        var r = RotationVector.Of(PublishedCase.Rotation(PublishedCase.Matrix(published.Inputs.GetProperty("R"))));
        var axis = PublishedArm.Vector(published.Expected.GetProperty("axis_up_to_sign"));

        Approximately.Equal(Math.PI, r.Norm, published.Tolerance, published.Source);
        Approximately.Equal(axis, (r.Dot(axis) < 0 ? -1 : 1) * r.Normalised(), published.Tolerance, published.Source);
    }

    [Fact]
    public void Of_EveryCoordinateHalfTurn_HasLengthPi()
    {
        RotationMatrix[] halfTurns = [new(1, 0, 0, 0, -1, 0, 0, 0, -1), new(-1, 0, 0, 0, 1, 0, 0, 0, -1), new(-1, 0, 0, 0, -1, 0, 0, 0, 1)];

        Assert.All(halfTurns, r => Approximately.Equal(Math.PI, RotationVector.Of(r).Norm, AngleTolerance, "half turn"));
        Assert.All(halfTurns, r => Approximately.Equal(r, RotationVector.ToMatrix(RotationVector.Of(r)), AngleTolerance, "half turn"));
    }

    [Fact]
    public void Of_Identity_IsZero() => Assert.Equal(Vector3D.Zero, RotationVector.Of(RotationMatrix.Identity));

    [Fact]
    public void Of_RandomRotation_TurnsBack() => Seeded.Cases(2000, random =>
    {
        // Spread over sizes as well as directions, the series range and the neighbourhood of 180° included.
        var size = random.Next(4) switch
        {
            0 => Math.Pow(10, random.Between(-12, -2)),
            1 => Math.PI - Math.Pow(10, random.Between(-12, -2)),
            _ => random.Between(0, Math.PI),
        };
        var r = size * random.Direction();
        var q = RotationVector.ToQuaternion(r);

        Approximately.Equal(r, RotationVector.Of(q), 4e-15 + 4e-16 * size, "from quaternion");
        Approximately.Equal(RotationVector.ToMatrix(r), RotationMatrix.FromQuaternion(UnitQuaternion.FromMatrix(RotationVector.ToMatrix(r))), AngleTolerance, "matrix");
    });

    [Fact]
    public void ToQuaternion_AcrossTheSeriesThreshold_DoesNotJump()
    {
        // Half angles on both sides of 1e-4; the components grow by the step and nothing else.
        var below = RotationVector.ToQuaternion(new(1.999999999e-4, 0, 0)).X;
        var above = RotationVector.ToQuaternion(new(2.000000001e-4, 0, 0)).X;

        Approximately.Equal(1e-13, above - below, 1e-19, "step");
    }

    [Fact]
    public void ToMatrix_OfRandomVector_IsOrthonormal() => Seeded.Cases(500, random =>
    {
        var R = RotationVector.ToMatrix(random.Between(0, 10) * random.Direction());

        Approximately.Equal(RotationMatrix.Identity, R.Transposed() * R, 1e-15 * 4, "RᵀR");
        Approximately.Equal(1, R.AxisX.Cross(R.AxisY).Dot(R.AxisZ), 1e-15 * 4, "det R");
    });
}
