using PathPortal.Engine.Arms;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Tests.Published;

namespace PathPortal.Engine.Tests.Geometry;

public sealed class EulerAnglesTests
{
    // Entries of a product of three rotations: a few roundings of numbers below 1.
    private const double RotationTolerance = 1e-14;

    public static TheoryData<EulerConvention> Conventions => [.. Enum.GetValues<EulerConvention>()];

    [Fact]
    public void ToMatrix_FixedXyz_IsRollPitchYawOfUrdf()
    {
        var published = PublishedCase.Get("URDF-01");
        var rotation = PublishedArm.Rpy(published.Inputs.GetProperty("rpy"));

        Approximately.Equal(PublishedCase.Rotation(published.ExpectedMatrix("R")), rotation, published.Tolerance, published.Source);
        var q = UnitQuaternion.FromMatrix(rotation);
        Approximately.Equal(
            PublishedCase.Numbers(published.Expected.GetProperty("quaternion_wxyz")), [q.W, q.X, q.Y, q.Z], published.Tolerance, published.Source);
    }

    [Fact]
    public void FromMatrix_MovingZyz_IsTheWristAnglesOfTheTextbook()
    {
        // Siciliano et al. 2009, sec. 2.4.1: the rotation of a spherical wrist is ZYZ by its joint values.
        var published = PublishedCase.Get("FK-04");
        var angles = EulerAngles.FromMatrix(EulerConvention.MovingZyz, published.ExpectedPose("T").Rotation);

        Approximately.Equal(
            PublishedCase.Numbers(published.Expected.GetProperty("zyz")), [angles.First, angles.Second, angles.Third], 1e-12, published.Source);
    }

    [Theory]
    [InlineData("JAC-09", EulerConvention.MovingZyz, "alpha", "beta", "gamma", "rates")]
    [InlineData("JAC-10", EulerConvention.MovingZyx, "yaw", "pitch", "roll", "rates_yaw_pitch_roll")]
    public void ToMatrix_MovedAtPublishedRates_TurnsAtThePublishedAngularVelocity(
        string id, EulerConvention convention, string first, string second, string third, string rates)
    {
        var published = PublishedCase.Get(id);
        var rate = published.Input(rates);
        const double h = 1e-5;
        RotationMatrix After(double time) => new EulerAngles(
            convention,
            published.InputNumber(first) + time * rate[0],
            published.InputNumber(second) + time * rate[1],
            published.InputNumber(third) + time * rate[2]).ToMatrix();
        var omega = 1 / (2 * h) * RotationVector.Of(After(h) * After(-h).Transposed());

        // rad/s; central differences over 1e-5 s: 1e-10 in the square of the step, 1e-11 in rounding.
        Approximately.Equal(PublishedArm.Vector(published.Expected.GetProperty("omega")), omega, 1e-9, published.Source);
    }

    [Fact]
    public void FromMatrix_FlangeOfAPublishedArm_HasThePublishedZyzAngles()
    {
        var published = PublishedCase.Get("JAC-11");
        var flange = ArmPose.Compute(PublishedArm.Of(published), published.Input("q")).Flange;
        var angles = EulerAngles.FromMatrix(EulerConvention.MovingZyz, flange.Rotation);

        Approximately.Equal(
            PublishedCase.Numbers(published.Expected.GetProperty("zyz")), [angles.First, angles.Second, angles.Third], published.Tolerance, published.Source);
    }

    [Theory]
    [MemberData(nameof(Conventions))]
    public void FromMatrix_OfRandomRotations_MakesTheSameRotation(EulerConvention convention) => Seeded.Cases(300, random =>
    {
        var rotation = random.Rotation();
        var angles = EulerAngles.FromMatrix(convention, rotation);

        Approximately.Equal(rotation, angles.ToMatrix(), 1e-13, $"{convention}");
    });

    [Theory]
    [MemberData(nameof(Conventions))]
    public void FromMatrix_AtAndNearThePoles_MakesTheSameRotation(EulerConvention convention)
    {
        double[] middles = [0, Math.PI / 2, -Math.PI / 2, Math.PI, 1e-13, 1e-9, Math.PI / 2 - 1e-9, Math.PI - 1e-9];
        foreach (var middle in middles)
        {
            var rotation = new EulerAngles(convention, 0.7, middle, -1.9).ToMatrix();
            var again = EulerAngles.FromMatrix(convention, rotation);

            // Below the pole threshold of 1e-10 the outer turns are merged, at a cost of that size.
            Approximately.Equal(rotation, again.ToMatrix(), 2e-10, $"{convention}, middle {middle}");
        }
    }

    [Fact]
    public void FromMatrix_InItsOwnRange_GivesTheAnglesBack() => Seeded.Cases(300, random =>
    {
        foreach (var convention in Enum.GetValues<EulerConvention>())
        {
            var name = convention.ToString();
            var repeated = name[^3..].ToUpperInvariant() is var letters && letters[0] == letters[2];
            var middle = repeated ? random.Between(0.01, 3.13) : random.Between(-1.56, 1.56);
            var angles = new EulerAngles(convention, random.Between(-3.1, 3.1), middle, random.Between(-3.1, 3.1));
            var again = EulerAngles.FromMatrix(convention, angles.ToMatrix());

            // 0.01 rad from a pole angles lose two digits.
            Approximately.Equal([angles.First, angles.Second, angles.Third], [again.First, again.Second, again.Third], 1e-12, name);
        }
    });

    [Fact]
    public void ToMatrix_FixedAndMovingInOppositeOrder_AreTheSame() => Seeded.Cases(100, random =>
    {
        var (a, b, c) = (random.Between(-3, 3), random.Between(-3, 3), random.Between(-3, 3));

        Approximately.Equal(
            new EulerAngles(EulerConvention.FixedXyz, a, b, c).ToMatrix(),
            new EulerAngles(EulerConvention.MovingZyx, c, b, a).ToMatrix(),
            RotationTolerance,
            "roll, pitch, yaw");
    });

    [Fact]
    public void ToMatrix_RightAnglesInDegrees_AreExact()
    {
        var rotation = EulerAngles.ToMatrix(EulerConvention.FixedXyz, Angle.FromDegrees(180), Angle.Zero, Angle.FromDegrees(90));

        Assert.Equal(new RotationMatrix(0, 1, 0, 1, 0, 0, 0, 0, -1), rotation);
    }
}
