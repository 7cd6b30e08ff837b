using PathPortal.Engine.Arms;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Tests.Published;

namespace PathPortal.Engine.Tests.Arms;

public sealed class GeometricJacobianTests
{
    // 1/s on entries of order one: central differences over 1e-6 rad are good to 1e-12 in the square of the step and 1e-10 in rounding.
    private const double DifferenceTolerance = 1e-8;

    [Theory]
    [InlineData("JAC-03", "J_P", 3)]
    [InlineData("JAC-04", "J", 6)]
    [InlineData("JAC-07", "J_base", 6)]
    public void Compute_PublishedArm_IsThePublishedMatrix(string id, string name, int rows)
    {
        var published = PublishedCase.Get(id);
        var J = GeometricJacobian.Compute(PublishedArm.Of(published), published.Input("q"), RigidTransform.Identity);

        AssertRows(published.ExpectedMatrix(name), J, [.. Enumerable.Range(0, rows)], published);
    }

    [Fact]
    public void Compute_PlanarTwoJoints_IsTheClosedForm()
    {
        var published = PublishedCase.Get("JAC-01");
        var J = GeometricJacobian.Compute(
            TestArms.Planar(published.InputNumber("l1"), published.InputNumber("l2")), published.Input("q"), RigidTransform.Identity);

        AssertRows(published.ExpectedMatrix("J"), J, [0, 1], published);
        Approximately.Equal(
            published.ExpectedNumber("det"), J[0, 0] * J[1, 1] - J[0, 1] * J[1, 0], published.Tolerance, published.Source);
    }

    [Fact]
    public void Compute_PlanarThreeJoints_HasRowsVxVyWz()
    {
        var published = PublishedCase.Get("JAC-02");
        var J = GeometricJacobian.Compute(PublishedArm.Of(published), published.Input("q"), RigidTransform.Identity);

        AssertRows(published.ExpectedMatrix("J"), J, [0, 1, 5], published);
    }

    [Fact]
    public void Compute_ScrewAxisExample_IsNeitherSpaceNorBodyJacobian()
    {
        var published = PublishedCase.Get("FK-11");
        var arm = PublishedArm.FromScrews(published.Inputs.GetProperty("S_space_omega_v"), published.Inputs.GetProperty("M"));
        var J = GeometricJacobian.Compute(arm, published.Input("q2"), RigidTransform.Identity);

        AssertRows(published.ExpectedMatrix("Jgeo_q2"), J, [0, 1, 2, 3, 4, 5], published);

        // JAC-06: v_tool = v_space − p × ω, and geometric = R · body with rows swapped.
        var both = PublishedCase.Get("JAC-06");
        var (space, body) = (both.ExpectedMatrix("J_space"), both.ExpectedMatrix("J_body"));
        var tool = ArmPose.Compute(arm, published.Input("q2")).Flange;
        for (var i = 0; i < 6; i++)
        {
            var omega = new Vector3D(space[0][i], space[1][i], space[2][i]);
            var v = new Vector3D(space[3][i], space[4][i], space[5][i]) - tool.Translation.Cross(omega);
            Approximately.Equal(v, new Vector3D(J[0, i], J[1, i], J[2, i]), both.Tolerance, both.Source);
            Approximately.Equal(omega, new Vector3D(J[3, i], J[4, i], J[5, i]), both.Tolerance, both.Source);
            var bodyTwist = new Twist(new(body[3][i], body[4][i], body[5][i]), new(body[0][i], body[1][i], body[2][i])).InAxesOf(tool.Rotation);
            Approximately.Equal(bodyTwist.Linear, new Vector3D(J[0, i], J[1, i], J[2, i]), both.Tolerance, both.Source);
            Approximately.Equal(bodyTwist.Angular, new Vector3D(J[3, i], J[4, i], J[5, i]), both.Tolerance, both.Source);
        }
    }

    [Fact]
    public void Compute_RandomArms_AgreesWithCentralDifferences() => Seeded.Cases(300, random =>
    {
        var arm = TestArms.Random(random, random.Next(1, 9));
        var q = TestArms.RandomJoints(random, arm);
        var X_FT = random.Pose(0.3);
        var J = GeometricJacobian.Compute(arm, q, X_FT);
        const double h = 1e-6;
        for (var i = 0; i < q.Length; i++)
        {
            var (plus, minus) = (q.ToArray(), q.ToArray());
            (plus[i], minus[i]) = (q[i] + h, q[i] - h);
            var (after, before) = (ArmPose.Compute(arm, plus).Tool(X_FT), ArmPose.Compute(arm, minus).Tool(X_FT));
            var linear = 1 / (2 * h) * (after.Translation - before.Translation);
            var angular = 1 / (2 * h) * RotationVector.Of(after.Rotation * before.Rotation.Transposed());

            Approximately.Equal(linear, new Vector3D(J[0, i], J[1, i], J[2, i]), DifferenceTolerance, $"linear {i}");
            Approximately.Equal(angular, new Vector3D(J[3, i], J[4, i], J[5, i]), DifferenceTolerance, $"angular {i}");
        }
    });

    [Fact]
    public void Times_RandomSpeeds_IsTheSumOfColumns() => Seeded.Cases(50, random =>
    {
        var arm = TestArms.Random(random, 6);
        var J = GeometricJacobian.Compute(arm, TestArms.RandomJoints(random, arm), RigidTransform.Identity);
        double[] speeds = [.. Enumerable.Range(0, 6).Select(_ => random.Between(-2, 2))];
        var sum = Twist.Zero;
        for (var i = 0; i < 6; i++)
        {
            sum += speeds[i] * new Twist(new(J[0, i], J[1, i], J[2, i]), new(J[3, i], J[4, i], J[5, i]));
        }

        Approximately.Equal(sum.Linear, J.Times(speeds).Linear, 1e-13, "linear");
        Approximately.Equal(sum.Angular, J.Times(speeds).Angular, 1e-13, "angular");
    });

    private static void AssertRows(double[][] expected, GeometricJacobian J, int[] rows, PublishedCase published)
    {
        for (var row = 0; row < rows.Length; row++)
        {
            for (var i = 0; i < J.JointCount; i++)
            {
                Approximately.Equal(expected[row][i], J[rows[row], i], published.Tolerance, $"{published.Source} J[{rows[row]},{i}]");
            }
        }
    }
}
