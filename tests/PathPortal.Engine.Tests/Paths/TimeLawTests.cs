using PathPortal.Engine.Paths;
using PathPortal.Engine.Tests.Published;

namespace PathPortal.Engine.Tests.Paths;

public sealed class TimeLawTests
{
    [Fact]
    public void Cubic_PublishedPoints_Match()
    {
        var published = PublishedCase.Get("TRJ-01");
        AssertLaw(published, CubicLaw.At, CubicLaw.PeakFirst, CubicLaw.PeakSecond);
    }

    [Fact]
    public void Quintic_PublishedPoints_Match()
    {
        var published = PublishedCase.Get("TRJ-02");
        AssertLaw(published, QuinticLaw.At, QuinticLaw.PeakFirst, QuinticLaw.PeakSecond);
        foreach (var u in PublishedCase.Numbers(published.Expected.GetProperty("u_of_a_peak")))
        {
            Approximately.Equal(QuinticLaw.PeakSecond, Math.Abs(QuinticLaw.At(u).Second), published.Tolerance, published.Source);
        }
    }

    [Fact]
    public void CubicAndQuintic_LibraryValues_Match()
    {
        var published = PublishedCase.Get("TRJ-03");
        var u = published.InputNumber("t") / published.InputNumber("Tf");

        Approximately.Equal(published.ExpectedNumber("cubic"), CubicLaw.At(u).Value, published.Tolerance, published.Source);
        Approximately.Equal(published.ExpectedNumber("quintic"), QuinticLaw.At(u).Value, published.Tolerance, published.Source);
    }

    [Fact]
    public void Trapezoid_LongAndShortWay_MatchPublishedTimes()
    {
        var published = PublishedCase.Get("TRJ-05");
        var cases = PublishedCase.Matrix(published.Inputs.GetProperty("cases"));
        foreach (var (i, expected) in published.Expected.GetProperty("results").EnumerateArray().Index())
        {
            var law = TrapezoidalLaw.Plan(cases[i][0], cases[i][1], cases[i][2]);
            Approximately.Equal(expected.GetProperty("T").GetDouble(), law.Duration, published.Tolerance, published.Source);
            Approximately.Equal(expected.GetProperty("t_acc").GetDouble(), law.AccelerationTime, published.Tolerance, published.Source);
            Approximately.Equal(expected.GetProperty("v_peak").GetDouble(), law.PeakSpeed, published.Tolerance, published.Source);
        }
    }

    [Fact]
    public void Derivatives_OfAllLaws_AgreeWithCentralDifferences() => Seeded.Cases(300, random =>
    {
        const double h = 1e-6;
        var u = random.Between(0.01, 0.99);
        AssertDerivatives(CubicLaw.At, u, h);
        AssertDerivatives(QuinticLaw.At, u, h);

        var law = TrapezoidalLaw.Plan(random.Between(0.01, 2), random.Between(0.05, 1), random.Between(0.1, 5));
        var t = random.Between(0.01, 0.99) * law.Duration;
        if (Math.Abs(t - law.AccelerationTime) > 1e-3 && Math.Abs(law.Duration - t - law.AccelerationTime) > 1e-3)
        {
            AssertDerivatives(law.At, t, h);
        }
    });

    [Fact]
    public void Trapezoid_RandomWays_EndThereAtRestInsideTheLimits() => Seeded.Cases(500, random =>
    {
        var (distance, speed, acceleration) = (random.Between(0, 2), random.Between(0.05, 1), random.Between(0.1, 5));
        var law = TrapezoidalLaw.Plan(distance, speed, acceleration);
        var last = 0.0;
        for (var i = 0; i <= 200; i++)
        {
            var at = law.At(law.Duration * i / 200);
            Assert.InRange(at.Value, last - 1e-15, distance + 1e-15);
            Assert.InRange(at.First, 0, speed * (1 + 1e-12));
            last = at.Value;
        }

        Approximately.Equal(distance, law.At(law.Duration).Value, 1e-15, "end");
        Approximately.Equal(0, law.At(law.Duration).First, 0, "speed at the end");
    });

    [Theory]
    [InlineData(-1, 1, 1)]
    [InlineData(double.NaN, 1, 1)]
    [InlineData(1, 0, 1)]
    [InlineData(1, 1, double.NaN)]
    public void Plan_ImpossibleInput_IsRefused(double distance, double speed, double acceleration) =>
        Assert.Throws<ArgumentOutOfRangeException>(() => TrapezoidalLaw.Plan(distance, speed, acceleration));

    [Fact]
    public void Plan_NoWay_TakesNoTime() => Assert.Equal(0, TrapezoidalLaw.Plan(0, 1, 1).Duration);

    private static void AssertLaw(PublishedCase published, Func<double, LawValue> law, double peakFirst, double peakSecond)
    {
        var (u, s) = (published.Input("u"), PublishedCase.Numbers(published.Expected.GetProperty("s")));
        for (var i = 0; i < u.Length; i++)
        {
            Approximately.Equal(s[i], law(u[i]).Value, published.Tolerance, published.Source);
        }

        var (D, T) = (published.InputNumber("D"), published.InputNumber("T"));
        Approximately.Equal(published.ExpectedNumber("v_peak"), peakFirst * D / T, published.Tolerance, published.Source);
        Approximately.Equal(published.ExpectedNumber("a_peak"), peakSecond * D / (T * T), published.Tolerance, published.Source);
        Approximately.Equal(peakFirst, law(0.5).First, published.Tolerance, published.Source);
        Assert.Equal(new LawValue(1, 0, 0), law(1.1));
        Assert.Equal(new LawValue(0, 0, 0), law(-0.1));
    }

    private static void AssertDerivatives(Func<double, LawValue> law, double x, double h)
    {
        var (plus, at, minus) = (law(x + h), law(x), law(x - h));
        Approximately.Equal((plus.Value - minus.Value) / (2 * h), at.First, 1e-8, $"first at {x}");
        Approximately.Equal((plus.First - minus.First) / (2 * h), at.Second, 1e-7, $"second at {x}");
    }
}
