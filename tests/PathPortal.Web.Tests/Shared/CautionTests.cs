using Bunit;
using PathPortal.Web.Shared;

namespace PathPortal.Web.Tests.Shared;

public sealed class CautionTests : BunitContext
{
    [Fact]
    public void Caution_Always_NamesSpeedSourceAndEverythingNotChecked()
    {
        var text = Render<Caution>().Markup;
        Assert.Contains("250 mm/s", text, StringComparison.Ordinal);
        Assert.Contains("ISO 10218-1", text, StringComparison.Ordinal);
        foreach (var word in new[] { "Collisions", "forces", "Cables", "Payload", "Safety functions", "risk assessment" })
            Assert.Contains(word, text, StringComparison.Ordinal);
    }
}
