using MathNet.Numerics.LinearAlgebra;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Postures;
using PathPortal.Engine.Tests.Published;

namespace PathPortal.Engine.Tests.Postures;

public sealed class DampedLeastSquaresTests
{
    [Fact]
    public void Solve_NearlySingularPlanarArm_IsThePublishedVelocity()
    {
        var published = PublishedCase.Get("DLS-01");
        var J = published.ExpectedMatrix("J").SelectMany(row => row).ToArray();
        var lambda = published.InputNumber("lam");

        Approximately.Equal(
            PublishedCase.Numbers(published.Expected.GetProperty("qdot")),
            Solve(J, 2, 2, lambda * lambda, published.Input("v")),
            published.Tolerance,
            published.Source);
    }

    [Fact]
    public void Solve_AtASingularity_IgnoresTheLostDirection()
    {
        var published = PublishedCase.Get("DLS-08");
        var arm = TestArms.Planar(published.InputNumber("l1"), published.InputNumber("l2"));
        double[] q = [.. published.Input("q_deg").Select(d => d * Math.PI / 180)];
        var full = GeometricJacobian.Compute(arm, q, RigidTransform.Identity);
        double[] J = [full[0, 0], full[0, 1], full[1, 0], full[1, 1]];
        var damping = Math.Pow(published.InputNumber("lam"), 2);

        foreach (var direction in new[] { "radial", "tangential" })
        {
            Approximately.Equal(
                PublishedCase.Numbers(published.Expected.GetProperty("qdot_" + direction)),
                Solve(J, 2, 2, damping, published.Input("v_" + direction)),
                published.Tolerance,
                published.Source);
        }
    }

    [Fact]
    public void Solve_ReferenceLibraryArms_AgreesWithTheirDampedVelocities()
    {
        foreach (var entry in PublishedCase.File("kdl").EnumerateArray())
        {
            foreach (var item in entry.GetProperty("cases").EnumerateArray())
            {
                var rows = PublishedCase.Matrix(item.GetProperty("expected").GetProperty("J"));
                var lambda = item.GetProperty("inputs").GetProperty("lambda").GetDouble();
                var expected = PublishedCase.Numbers(item.GetProperty("expected").GetProperty("qdot_numpy_dls"));
                var found = Solve(
                    [.. rows.SelectMany(r => r)], 6, rows[0].Length, lambda * lambda, PublishedCase.Numbers(item.GetProperty("inputs").GetProperty("twist")));

                // rad/s; the condition of the damped system, (σ_max/λ)² of a few thousand, costs four digits of sixteen.
                Approximately.Equal(expected, found, 1e-11, entry.GetProperty("name").GetString()!);
            }
        }
    }

    [Fact]
    public void Solve_RandomMatrices_AgreesWithMathNetAndKeepsTheBound() => Seeded.Cases(500, random =>
    {
        var (m, n) = (random.Next(1, 7), random.Next(1, 9));
        double[] J = [.. Enumerable.Range(0, m * n).Select(_ => random.Between(-1, 1))];
        double[] u = [.. Enumerable.Range(0, m).Select(_ => random.Between(-1, 1))];
        var lambda = random.Between(0.01, 0.5);
        var x = Solve(J, m, n, lambda * lambda, u);

        var matrix = Matrix<double>.Build.Dense(m, n, (i, k) => J[i * n + k]);
        var svd = matrix.Svd();
        var expected = new double[n];
        for (var i = 0; i < Math.Min(m, n); i++)
        {
            var gain = svd.S[i] / (svd.S[i] * svd.S[i] + lambda * lambda) * svd.U.Column(i).DotProduct(Vector<double>.Build.Dense(u));
            for (var k = 0; k < n; k++)
            {
                expected[k] += gain * svd.VT[i, k];
            }
        }

        Approximately.Equal(expected, x, 1e-10, $"{m}×{n}, λ {lambda:G3}");

        // |q̇| ≤ |v|/(2λ) for constant λ (Wampler 1986).
        Assert.True(Norm(x) <= Norm(u) / (2 * lambda) * (1 + 1e-12));
    });

    [Fact]
    public void Solve_NotFinite_IsRefused()
    {
        Span<double> x = new double[2];

        Assert.False(DampedLeastSquares.Solve([1, double.NaN, 0, 1], 2, 2, 0.01, [1, 1], x));
        Assert.False(DampedLeastSquares.Solve([0, 0, 0, 0], 2, 2, 0, [1, 1], x));
    }

    private static double[] Solve(double[] J, int m, int n, double damping, double[] u)
    {
        var x = new double[n];
        Assert.True(DampedLeastSquares.Solve(J, m, n, damping, u, x));
        return x;
    }

    private static double Norm(double[] v) => Math.Sqrt(v.Sum(c => c * c));
}
