using PathPortal.Engine.Arms;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;
using PathPortal.Engine.Tests.Published;

namespace PathPortal.Engine.Tests.Arms;

public sealed class ScaledJacobianTests
{
    private const double PerDegree = Math.PI / 180;

    [Fact]
    public void Manipulability_PlanarTwoJoints_IsProductOfLinksTimesSine()
    {
        var published = PublishedCase.Get("MAN-01");
        var arm = TestArms.Planar(published.InputNumber("l1"), published.InputNumber("l2"));
        var angles = published.Input("q2_deg");
        var expected = PublishedCase.Numbers(published.Expected.GetProperty("w"));
        for (var i = 0; i < angles.Length; i++)
        {
            // Two columns in three rows, the third zero: the product of the two singular values is √det(JᵀJ).
            var sigma = Planar(arm, 0.2, angles[i] * PerDegree).SingularValues;
            Approximately.Equal(expected[i], sigma[0] * sigma[1], published.Tolerance, published.Source);
        }
    }

    [Fact]
    public void SingularValues_IsotropicPlanarArm_AreEqual()
    {
        var published = PublishedCase.Get("MAN-02");
        var arm = TestArms.Planar(published.InputNumber("l1"), published.InputNumber("l2"));
        var jacobian = Planar(arm, published.InputNumber("q1_any"), published.InputNumber("q2_deg") * PerDegree);

        Approximately.Equal(PublishedCase.Numbers(published.Expected.GetProperty("sigma")), jacobian.SingularValues, published.Tolerance, published.Source);
        Approximately.Equal(published.ExpectedNumber("kappa"), jacobian.Condition, published.Tolerance, published.Source);
    }

    [Fact]
    public void SingularValues_PlanarTwoJoints_AreTheClosedForm()
    {
        var published = PublishedCase.Get("MAN-03");
        var arm = TestArms.Planar(published.InputNumber("l1"), published.InputNumber("l2"));
        foreach (var row in published.ExpectedMatrix("rows"))
        {
            var jacobian = Planar(arm, -0.4, row[0] * PerDegree);
            Approximately.Equal([row[1], row[2]], jacobian.SingularValues, published.Tolerance, published.Source);

            // κ is up to 28, and so is the loss of relative accuracy in it.
            Approximately.Equal(row[3], jacobian.Condition, 30 * published.Tolerance, published.Source);
        }
    }

    [Fact]
    public void SingularValues_IsotropicPlanarThreeJoints_NeedTheCharacteristicLength()
    {
        var published = PublishedCase.Get("MAN-04");
        var arm = TestArms.Planar(published.Input("links")) with { CharacteristicLength = published.InputNumber("characteristic_length") };
        double[] q = [.. published.Input("q_deg").Select(d => d * PerDegree)];

        Approximately.Equal(
            PublishedCase.Numbers(published.Expected.GetProperty("sigma_full_with_char_length")),
            ScaledJacobian.Compute(arm, q, RigidTransform.Identity).SingularValues,
            published.Tolerance,
            published.Source);
        Approximately.Equal(
            PublishedCase.Numbers(published.Expected.GetProperty("sigma_position")),
            [.. ScaledJacobian.Compute(arm with { CharacteristicLength = 1 }, q, RigidTransform.Identity, TaskKind.Point).SingularValues.Take(2)],
            published.Tolerance,
            published.Source);
    }

    [Fact]
    public void Manipulability_ArmOfThreeJoints_IsTheClosedForm()
    {
        var published = PublishedCase.Get("MAN-05");
        var jacobian = ScaledJacobian.Compute(PublishedArm.Of(published), published.Input("q"), RigidTransform.Identity, TaskKind.Point);

        Approximately.Equal(published.ExpectedNumber("w"), jacobian.Manipulability, published.Tolerance, published.Source);
    }

    [Fact]
    public void SingularValues_SphericalWrist_AreTheClosedForm()
    {
        // The wrist of FK-04 without its last length: at the wrist point only the angular rows are left.
        var published = PublishedCase.Get("MAN-06");
        double[] q = [.. published.Input("q_deg").Select(d => d * PerDegree)];
        var wrist = PublishedArm.Of(PublishedCase.Get("FK-04"));
        var jacobian = ScaledJacobian.Compute(wrist, q, RigidTransform.FromTranslation(0, 0, -0.1));

        Approximately.Equal(
            PublishedCase.Numbers(published.Expected.GetProperty("sigma")), jacobian.SingularValues, published.Tolerance, published.Source);
    }

    [Fact]
    public void Manipulability_SphericalWristArm_VanishesOnTheThreeLoci()
    {
        var published = PublishedCase.Get("MAN-07");
        var arm = PublishedArm.Of(published);

        Approximately.Equal(
            published.ExpectedNumber("absdet"),
            ScaledJacobian.Compute(arm, published.Input("q"), RigidTransform.Identity).Manipulability,
            published.Tolerance,
            published.Source);
        foreach (var locus in published.Inputs.GetProperty("singular_examples_deg").EnumerateObject())
        {
            double[] q = [.. PublishedCase.Numbers(locus.Value).Select(d => d * PerDegree)];
            var sigma = ScaledJacobian.Compute(arm, q, RigidTransform.Identity).SingularValues[^1];
            Assert.InRange(sigma, 0, published.ExpectedNumber("smallest_sigma_at_singular_examples_below"));
        }
    }

    [Fact]
    public void SingularValues_LongerTool_ChangeWhileTheDeterminantDoesNot()
    {
        var published = PublishedCase.Get("MAN-08");
        var arm = PublishedArm.Of(published);
        foreach (var row in published.ExpectedMatrix("rows"))
        {
            var jacobian = ScaledJacobian.Compute(arm, published.Input("q"), RigidTransform.FromTranslation(0.02, 0, row[0]));
            Approximately.Equal(row[1], jacobian.Manipulability, published.Tolerance, published.Source);
            Approximately.Equal(row[2], jacobian.SingularValues[^1], published.Tolerance, published.Source);
            Approximately.Equal(row[3], jacobian.Condition, 10 * published.Tolerance, published.Source);
        }
    }

    [Fact]
    public void Condition_OtherLengthUnit_IsAnotherNumber()
    {
        var published = PublishedCase.Get("MAN-09");
        var arm = PublishedArm.Of(published);
        double Condition(double length) => ScaledJacobian.Compute(
            arm with { CharacteristicLength = length }, published.Input("q"), RigidTransform.Identity).Condition;

        Approximately.Equal(published.ExpectedNumber("kappa_metre"), Condition(1), published.Tolerance, published.Source);
        Approximately.Equal(published.ExpectedNumber("kappa_char_length_0_3m"), Condition(0.3), published.Tolerance, published.Source);

        // Millimetres are a characteristic length of 1 mm; κ of 1,500 costs three digits.
        Approximately.Equal(published.ExpectedNumber("kappa_millimetre"), Condition(0.001), 1e3 * published.Tolerance, published.Source);
        Approximately.Equal(
            PublishedCase.Numbers(published.Expected.GetProperty("sigma_translation_only")),
            ScaledJacobian.Compute(arm, published.Input("q"), RigidTransform.Identity, TaskKind.Point).SingularValues,
            published.Tolerance,
            published.Source);
    }

    [Theory]
    [InlineData("MAN-10", "absdet", TaskKind.Pose)]
    [InlineData("MAN-11", "w_all", TaskKind.Pose)]
    [InlineData("MAN-11", "w_trans", TaskKind.Point)]
    public void Manipulability_PublishedArm_IsThePublishedNumber(string id, string name, TaskKind task)
    {
        var published = PublishedCase.Get(id);
        var jacobian = ScaledJacobian.Compute(PublishedArm.Of(published), published.Input("q"), RigidTransform.Identity, task);

        Approximately.Equal(published.ExpectedNumber(name), jacobian.Manipulability, published.Tolerance, published.Source);
    }

    [Fact]
    public void Compute_SlidingJoint_ScalesItsColumnByTheCharacteristicLength() => Seeded.Cases(100, random =>
    {
        var arm = TestArms.Random(random, random.Next(1, 9));
        var q = TestArms.RandomJoints(random, arm);
        var J = GeometricJacobian.Compute(arm, q, RigidTransform.Identity);
        var scaled = ScaledJacobian.Compute(arm, q, RigidTransform.Identity);
        for (var row = 0; row < 6; row++)
        {
            for (var i = 0; i < q.Length; i++)
            {
                var column = arm.Joints[i].Kind == JointKind.Prismatic ? arm.CharacteristicLength : 1;
                var factor = row < 3 ? column / arm.CharacteristicLength : column;
                Approximately.Equal(J[row, i] * factor, scaled[row, i], 1e-15 + 1e-15 * Math.Abs(J[row, i] * factor), $"[{row},{i}]");
            }
        }
    });

    private static ScaledJacobian Planar(ArmModel arm, double first, double second) =>
        ScaledJacobian.Compute(arm, [first, second], RigidTransform.Identity, TaskKind.Point);
}
