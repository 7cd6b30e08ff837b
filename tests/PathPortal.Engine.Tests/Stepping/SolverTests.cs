using MathNet.Numerics.LinearAlgebra;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Control;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Tests.Published;

namespace PathPortal.Engine.Tests.Stepping;

/// <summary>The solver against published numbers and, on random matrices, against MathNet's singular values and pseudo-inverse.</summary>
public sealed class SolverTests
{
    [Fact]
    public void Solve_NearSingularPlanarArm_MatchesPublishedDampedInverse()
    {
        var published = PublishedCase.Get("DLS-01");
        var matrix = ThreeRows(published.ExpectedMatrix("J"));
        var (speeds, smallest, _, _) = SolverProbe.Solve(
            matrix, [.. published.Input("v"), 0], Damping.Constant(published.InputNumber("lam")));
        Approximately.Equal(published.Expected.GetProperty("sigma")[1].GetDouble(), smallest, published.Tolerance, published.Source + " σ");
        Approximately.Equal(PublishedCase.Numbers(published.Expected.GetProperty("qdot")), speeds[..2], published.Tolerance, published.Source);
        (speeds, _, _, _) = SolverProbe.Solve(matrix, [.. published.Input("v"), 0], Damping.None);

        // κ = 277 takes two and a half digits of the published twelve.
        Approximately.Equal(PublishedCase.Numbers(published.Expected.GetProperty("qdot_undamped")), speeds[..2], 3e-10, published.Source);
    }

    [Fact]
    public void Solve_OneDirection_GainAndLossFollowTheLaw()
    {
        var gains = PublishedCase.Get("DLS-02");
        var losses = PublishedCase.Get("DLS-04");
        var lambda = gains.InputNumber("lam");
        var sigma = gains.Input("sigma");
        for (var i = 0; i < sigma.Length; i++)
        {
            var (speeds, _, _, _) = SolverProbe.Solve(Diagonal(sigma[i], 1, 1), [1, 0, 0], Damping.Constant(lambda));
            Approximately.Equal(PublishedCase.Numbers(gains.Expected.GetProperty("g"))[i], speeds[0], 1e-12, gains.Source);
            Approximately.Equal(PublishedCase.Numbers(losses.Expected.GetProperty("loss"))[i], 1 - sigma[i] * speeds[0], losses.Tolerance, losses.Source);
        }
    }

    [Fact]
    public void Solve_RandomMatricesUnderConstantDamping_NeverPassTheBound()
    {
        var published = PublishedCase.Get("DLS-03");
        var (lambda, size) = (published.InputNumber("lam"), published.InputNumber("v_norm"));
        Seeded.Cases(200, random =>
        {
            var twist = Enumerable.Range(0, 6).Select(_ => random.Between(-1, 1)).ToArray();
            var norm = Math.Sqrt(twist.Sum(v => v * v));
            var (speeds, _, _, _) = SolverProbe.Solve(Random(random, 6, 6), [.. twist.Select(v => v * size / norm)], Damping.Constant(lambda));
            Assert.True(Math.Sqrt(speeds.Sum(v => v * v)) <= published.ExpectedNumber("bound") * (1 + 1e-12), published.Source);
        });
    }

    [Fact]
    public void Solve_VariableDamping_SquaresTheFactorOnce()
    {
        var published = PublishedCase.Get("DLS-05");
        var damping = Damping.Variable(published.InputNumber("lam_max"), published.InputNumber("eps"));
        var sigma = published.Input("sigma");
        var expected = PublishedCase.Numbers(published.Expected.GetProperty("lam2"));
        for (var i = 0; i < sigma.Length; i++)
        {
            var (_, _, _, squared) = SolverProbe.Solve(Diagonal(sigma[i], 1, 1), [0, 0, 0], damping);

            // Two digits beyond the published 1e-14: at σ = ε the law ends in rounding of 1 − 1.
            Approximately.Equal(expected[i], squared, published.Tolerance, $"{published.Source} σ = {sigma[i]}");
        }
    }

    [Fact]
    public void Solve_VariableDamping_LargestGainIsThePublishedOne()
    {
        var published = PublishedCase.Get("DLS-06");
        foreach (var row in PublishedCase.Matrix(published.Expected.GetProperty("rows")))
        {
            var damping = Damping.Variable(row[0], row[1]);
            var largest = Enumerable.Range(1, 4000).Max(i => SolverProbe.Solve(Diagonal(i * row[1] / 2000, 1, 1), [1, 0, 0], damping).Speeds[0]);

            // A grid of two thousandths of ε finds a flat top to 1e-6 of it, a sharp one (λ = ε) only to a step.
            Approximately.Equal(row[3], largest, 1e-3 * row[3], published.Source);
            Assert.True(largest <= row[3] * (1 + 1e-9), published.Source);
        }
    }

    [Fact]
    public void Solve_ExactlySingular_LostDirectionStandsStill()
    {
        var published = PublishedCase.Get("DLS-08");
        var (l1, l2, q) = (published.InputNumber("l1"), published.InputNumber("l2"), published.Input("q_deg"));
        var (sin, cos) = Math.SinCos(q[0] * Math.PI / 180);
        var matrix = ThreeRows([[-(l1 + l2) * sin, -l2 * sin], [(l1 + l2) * cos, l2 * cos]]);
        var damping = Damping.Constant(published.InputNumber("lam"));
        Approximately.Equal(
            PublishedCase.Numbers(published.Expected.GetProperty("qdot_radial")),
            SolverProbe.Solve(matrix, [.. published.Input("v_radial"), 0], damping).Speeds[..2],
            published.Tolerance,
            published.Source);
        Approximately.Equal(
            PublishedCase.Numbers(published.Expected.GetProperty("qdot_tangential")),
            SolverProbe.Solve(matrix, [.. published.Input("v_tangential"), 0], damping).Speeds[..2],
            published.Tolerance,
            published.Source);
    }

    [Fact]
    public void Solve_SixJointArm_MatchesPublishedDampedAndUndamped()
    {
        var published = PublishedCase.Get("DLS-09");
        var arm = PublishedArm.Of(published);
        var jacobian = GeometricJacobian.Compute(arm, published.Input("q"), RigidTransform.Identity);
        double[][] matrix = [.. Enumerable.Range(0, 6).Select(row => Enumerable.Range(0, 6).Select(i => jacobian[row, i]).ToArray())];
        var sigma = PublishedCase.Numbers(published.Expected.GetProperty("sigma"));
        var (damped, smallest, largest, _) = SolverProbe.Solve(matrix, published.Input("twist"), Damping.Constant(published.InputNumber("lam")));
        Approximately.Equal(sigma[5], smallest, published.Tolerance, published.Source);
        Approximately.Equal(sigma[0], largest, published.Tolerance, published.Source);
        Approximately.Equal(PublishedCase.Numbers(published.Expected.GetProperty("qdot_full_dls")), damped, published.Tolerance, published.Source);
        Approximately.Equal(
            PublishedCase.Numbers(published.Expected.GetProperty("qdot_undamped")),
            SolverProbe.Solve(matrix, published.Input("twist"), Damping.None).Speeds,
            published.Tolerance,
            published.Source);
    }

    [Fact]
    public void Solve_RedundantArm_GivesSmallestSpeeds()
    {
        var published = PublishedCase.Get("RED-01");
        var (speeds, _, _, _) = SolverProbe.Solve(ThreeRows(published.ExpectedMatrix("J")), [.. published.Input("v"), 0], Damping.None);
        Approximately.Equal(PublishedCase.Numbers(published.Expected.GetProperty("qdot")), speeds[..3], published.Tolerance, published.Source);
    }

    [Fact]
    public void Solve_NullSpacePull_IsProjected()
    {
        // With no twist asked for, q̇ = P k₀ (middle − q): the published projector applied to the pull.
        var published = PublishedCase.Get("RED-02");
        var jacobian = ThreeRows(PublishedCase.Get("RED-01").ExpectedMatrix("J"));
        var projector = published.ExpectedMatrix("P");
        double[] joints = [.. published.Input("q"), 0];
        var limits = new JointLimits { Low = new(-2, "test"), High = new(2, "test") };
        var (speeds, _, _, _) = SolverProbe.Solve(jacobian, [0, 0, 0], Damping.None, 0.7, joints, limits);
        for (var i = 0; i < 3; i++)
        {
            var expected = Enumerable.Range(0, 3).Sum(j => projector[i][j] * -0.7 * joints[j]);
            Approximately.Equal(expected, speeds[i], published.Tolerance, published.Source);
        }
    }

    [Theory]
    [InlineData(6, 6)]
    [InlineData(6, 7)]
    [InlineData(6, 8)]
    [InlineData(5, 6)]
    [InlineData(3, 6)]
    [InlineData(3, 3)]
    public void Solve_RandomMatrices_MatchesMathNet(int rows, int joints) => Seeded.Cases(200, random =>
    {
        var matrix = Random(random, rows, joints);

        // Every other one nearly singular: the last row almost a copy of the first.
        if (random.Next(2) == 0)
        {
            var gap = Math.Pow(10, random.Between(-6, -1));
            matrix[rows - 1] = [.. matrix[0].Select(v => v + gap * random.Between(-1, 1))];
        }

        var twist = Enumerable.Range(0, rows).Select(_ => random.Between(-1, 1)).ToArray();
        var (speeds, smallest, largest, _) = SolverProbe.Solve(matrix, twist, Damping.None);
        var M = Matrix<double>.Build.DenseOfRowArrays(matrix);
        var svd = M.Svd();

        // MathNet finds singular values to rounding of the largest.
        Approximately.Equal(svd.S[^1], smallest, 1e-13 * svd.S[0], "smallest singular value");
        Approximately.Equal(svd.S[0], largest, 1e-13 * svd.S[0], "largest singular value");
        var expected = M.PseudoInverse() * Vector<double>.Build.DenseOfArray(twist);

        // The pseudo-inverse loses κ, twice where it passes through squares.
        var condition = svd.S[0] / svd.S[^1];
        Approximately.Equal(expected.ToArray(), speeds, 1e-13 * condition * condition / svd.S[0] + 1e-12 * expected.L2Norm(), $"speeds at κ {condition:G3}");
    });

    private static double[][] Random(Random random, int rows, int columns) =>
        [.. Enumerable.Range(0, rows).Select(_ => Enumerable.Range(0, columns).Select(_ => random.Between(-1, 1)).ToArray())];

    private static double[][] Diagonal(params double[] values) =>
        [.. values.Select((v, i) => Enumerable.Range(0, values.Length).Select(j => i == j ? v : 0).ToArray())];

    // A third row and joint of their own, which the two given rows don't touch.
    private static double[][] ThreeRows(double[][] two) =>
        [[.. two[0], 0], [.. two[1], 0], [.. two[0].Select(_ => 0.0), 0.5]];
}
