using PathPortal.Engine.Arms;
using PathPortal.Engine.Postures;

namespace PathPortal.Engine.Tests.Postures;

public sealed class PosturePartsTests
{
    [Fact]
    public void TrigEquation_RandomCoefficients_SolvesTheEquation() => Seeded.Cases(1000, random =>
    {
        var (a, b) = (random.Between(-2, 2), random.Between(-2, 2));
        var c = random.Between(-1, 1) * Math.Sqrt(a * a + b * b);
        Span<double> theta = stackalloc double[2];

        Assert.Equal(2, TrigEquation.Solve(a, b, c, 0, theta));
        Approximately.Equal(c, a * Math.Cos(theta[0]) + b * Math.Sin(theta[0]), 1e-14, "first");
        Approximately.Equal(c, a * Math.Cos(theta[1]) + b * Math.Sin(theta[1]), 1e-14, "second");
    });

    [Theory]
    [InlineData(2, 0, 2, 1)]
    [InlineData(2, 0, -2, 1)]
    [InlineData(2, 0, 2.0000001, 0)]
    [InlineData(0, 0, 1, 0)]
    [InlineData(double.NaN, 0, 1, 0)]
    public void TrigEquation_AtAndBeyondReach_CountsItsSolutions(double a, double b, double c, int expected)
    {
        Span<double> theta = stackalloc double[2];

        Assert.Equal(expected, TrigEquation.Solve(a, b, c, 1e-9, theta));
    }

    [Fact]
    public void HaltonSequence_FirstPoints_AreTheRadicalInverses()
    {
        // Radical inverse in base 2 and 3 (Halton 1960): 1 → 0.1, 2 → 0.01, 3 → 0.11; 1 → 0.1, 2 → 0.2, 3 → 0.01 in base 3.
        Approximately.Equal([0.5, 0.25, 0.75], [.. Enumerable.Range(1, 3).Select(i => HaltonSequence.Value(i, 0))], 0, "base 2");
        Approximately.Equal([1 / 3.0, 2 / 3.0, 1 / 9.0], [.. Enumerable.Range(1, 3).Select(i => HaltonSequence.Value(i, 1))], 1e-16, "base 3");
    }

    [Fact]
    public void Wrap_AnyAngle_IsInRangeAndSame() => Seeded.Cases(500, random =>
    {
        var angle = random.Between(-100, 100);
        var wrapped = JointTurns.Wrap(angle);

        Assert.InRange(wrapped, -Math.PI, Math.PI);
        Approximately.Equal(0, Math.IEEERemainder(angle - wrapped, 2 * Math.PI), 1e-13, "turns");
    });

    [Fact]
    public void Wrap_HalfTurnEitherWay_IsPlusPi()
    {
        Assert.Equal(Math.PI, JointTurns.Wrap(Math.PI));
        Assert.Equal(Math.PI, JointTurns.Wrap(-Math.PI));
    }

    [Theory]
    [InlineData(-7, 7, 1.0, new[] { 1.0, 1 - 2 * Math.PI })]
    [InlineData(-3, 3, 4.0, new[] { 4 - 2 * Math.PI })]
    [InlineData(0.5, 0.9, 1.0, new double[0])]
    [InlineData(6.5, 7.5, 1.0, new[] { 1 + 2 * Math.PI })]
    public void Inside_LimitsInRadians_GivesEveryTurn(double low, double high, double value, double[] expected) =>
        Approximately.Equal(expected, JointTurns.Inside(Joint(TestArms.Limits(low, high)), value), 1e-14, "values");

    [Theory]
    [InlineData(-1e12, 1e12, 1.0, 1.0)]
    [InlineData(1e6, 1e6 + 100, 1.0, 1e6)]
    [InlineData(-1e6 - 100, -1e6, 1.0, -1e6)]
    public void Inside_HugeRange_GivesFiveTurnsNearestToZero(double low, double high, double value, double nearest)
    {
        var values = JointTurns.Inside(Joint(TestArms.Limits(low, high)), value);

        Assert.Equal(5, values.Count);
        Assert.All(values, v => Assert.InRange(v, low, high));
        Assert.All(values, v => Approximately.Equal(0, Math.IEEERemainder(v - value, 2 * Math.PI), 1e-9, "turns; 1e6 rad is good to 1e-10"));
        Assert.InRange(Math.Abs(values[0] - nearest), 0, 2 * Math.PI);
    }

    [Fact]
    public void Inside_NoLimitsOrContinuous_IsThePrincipalValue()
    {
        Approximately.Equal([4 - 2 * Math.PI], JointTurns.Inside(Joint(new()), 4), 1e-15, "no limits");
        Approximately.Equal([4 - 2 * Math.PI], JointTurns.Inside(Joint(new() { Continuous = true }), 4), 1e-15, "continuous");
    }

    [Theory]
    [InlineData(-7, 7, 0.5, 6.5, 0.5 + 2 * Math.PI)]
    [InlineData(-7, 6, 0.5, 6.5, 0.5)]
    [InlineData(-30, 30, 0.5, -27, 0.5 - 8 * Math.PI)]
    public void Nearest_WoundUpSeed_StaysOnTheSeedsTurn(double low, double high, double value, double seed, double expected) =>
        Approximately.Equal(expected, JointTurns.Nearest(Joint(TestArms.Limits(low, high)), value, seed)!.Value, 1e-14, "value");

    [Fact]
    public void Nearest_NoTurnInside_IsNull() => Assert.Null(JointTurns.Nearest(Joint(TestArms.Limits(-0.1, 0.1)), 1, 0));

    private static Joint Joint(JointLimits limits) => TestArms.SixJoints().Joints[0] with { Limits = limits };
}
