using System.Globalization;
using PathPortal.Web.Shared;

namespace PathPortal.Web.Tests.Shared;

public sealed class FormatTests
{
    [Theory]
    [InlineData("de-DE")]
    [InlineData("fr-FR")]
    [InlineData("tr-TR")]
    [InlineData("ar-SA")]
    public void Number_AnyCulture_ReadsTheSame(string culture)
    {
        var before = CultureInfo.CurrentCulture;
        try
        {
            CultureInfo.CurrentCulture = CultureInfo.GetCultureInfo(culture);
            Assert.Equal("\u221212\u202f345.68\u202fmm", Format.Millimetres(-12.345678));
            Assert.Equal("57.3°", Format.Degrees(1));
            Assert.Equal("200\u202f000", Format.Count(200_000));
            Assert.Equal("2026-03-29 03:30 Europe/Berlin", Format.Moment(new(2026, 3, 29, 1, 30, 0, TimeSpan.Zero), TimeZones.Find("Europe/Berlin")));
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }

    [Fact]
    public void Number_RoundsToZero_HasNoMinus() => Assert.Equal("0.00", Format.Number(-0.0004, 2));

    [Theory]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    public void Millimetres_NotFinite_SaysSo(double value) => Assert.Equal("not a number", Format.Millimetres(value));

    [Fact]
    public void Moment_ZoneUnknown_IsUtcAndSaysSo() =>
        Assert.Equal("2026-01-02 03:04 UTC", Format.Moment(new(2026, 1, 2, 3, 4, 0, TimeSpan.Zero), TimeZones.Find("Nowhere/Atall")));
}
