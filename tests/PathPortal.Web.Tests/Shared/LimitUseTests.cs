using PathPortal.Web.Shared;

namespace PathPortal.Web.Tests.Shared;

public sealed class LimitUseTests
{
    [Theory]
    [InlineData(0, "0 %", LimitUseBand.Step0)]
    [InlineData(0.19, "19 %", LimitUseBand.Step0)]
    [InlineData(0.2, "20 %", LimitUseBand.Step1)]
    [InlineData(0.4, "40 %", LimitUseBand.Step2)]
    [InlineData(0.61, "61 %", LimitUseBand.Step3)]
    [InlineData(0.8, "80 %", LimitUseBand.Near)]
    [InlineData(0.994, "99 %", LimitUseBand.Near)]
    [InlineData(0.9952, ">99 %", LimitUseBand.Near)]
    [InlineData(1, "100 %", LimitUseBand.Near)]
    [InlineData(1 + 1e-10, "100 %", LimitUseBand.Near)]
    [InlineData(1 + 1e-8, ">100 %", LimitUseBand.Over)]
    [InlineData(1.004, ">100 %", LimitUseBand.Over)]
    [InlineData(1.31, "131 %", LimitUseBand.Over)]
    [InlineData(9.99, "999 %", LimitUseBand.Over)]
    [InlineData(9.991, ">999 %", LimitUseBand.Over)]
    [InlineData(double.PositiveInfinity, ">999 %", LimitUseBand.Over)]
    [InlineData(double.NaN, ">999 %", LimitUseBand.Over)]
    public void Text_Use_NeverHidesOnWhichSideOfTheLimitItIs(double use, string text, LimitUseBand band)
    {
        var shown = LimitUse.Of(use);
        Assert.Equal(text, shown.Text);
        Assert.Equal(band, shown.Band);
    }

    [Fact]
    public void Text_NothingJudged_SaysSo()
    {
        Assert.Equal("not assessable", LimitUse.NotAssessable.Text);
        Assert.Equal(LimitUseBand.NotAssessable, LimitUse.NotAssessable.Band);
    }

    [Fact]
    public void Band_NearThresholdOfTheCriterion_Moves()
    {
        Assert.Equal(LimitUseBand.Near, LimitUse.Of(0.6, near: 0.5).Band);
        Assert.Equal(LimitUseBand.Step3, LimitUse.Of(0.61, near: 0.8).Band);
    }

    [Fact]
    public void Sign_NearAndOver_DifferWithoutColour()
    {
        var signs = new[] { 0.1, 0.9, 1.1 }.Select(u => LimitUse.Of(u).Sign).ToArray();
        Assert.Equal(3, signs.Distinct().Count());
    }
}
