using Bunit;
using PathPortal.Web.Shared;

namespace PathPortal.Web.Tests.Shared;

public sealed class LimitUseBadgeTests : BunitContext
{
    [Fact]
    public void Badge_Over_SaysItInWordsAndSign()
    {
        var shown = Render<LimitUseBadge>(p => p.Add(b => b.Use, LimitUse.Of(1.31)).Add(b => b.Of, "joint speed on North 3"));
        var badge = shown.Find(".use");
        Assert.Contains("use-over", badge.ClassName, StringComparison.Ordinal);
        Assert.Equal("▲131 %, over the limit, joint speed on North 3", badge.TextContent);
    }

    [Fact]
    public void Badge_Advisory_IsMarkedAndExplained()
    {
        var badge = Render<LimitUseBadge>(p => p.Add(b => b.Use, LimitUse.Of(1.31, advisory: true))).Find(".use");
        Assert.Contains("advisory", badge.ClassName, StringComparison.Ordinal);
        Assert.Contains("does not decide the verdict", badge.TextContent, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(0.75, "50%")]
    [InlineData(1.0, "66.67%")]
    [InlineData(7.0, "100%")]
    [InlineData(double.PositiveInfinity, "100%")]
    public void Bar_Use_FillsToOneAndAHalf(double use, string width)
    {
        var fill = Render<LimitUseBar>(p => p.Add(b => b.Use, LimitUse.Of(use))).Find(".fill");
        Assert.Equal($"width: {width}", fill.GetAttribute("style"));
    }

    [Fact]
    public void Bar_NotAssessable_HasNoBar() =>
        Assert.Empty(Render<LimitUseBar>(p => p.Add(b => b.Use, LimitUse.NotAssessable)).FindAll(".track"));
}
