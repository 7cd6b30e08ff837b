using System.Globalization;

namespace PathPortal.Web.Shared;

/// <summary>
/// How a limit use reads and looks, the same at every zoom. Percent: 100 is exactly at the limit. Pass means at most 100 + 1e-7.
/// </summary>
public readonly record struct LimitUse
{
    public const double PassCeilingPercent = 100 + 1e-7;
    public const double DefaultNearPercent = 80;
    private const double LargestShownPercent = 999;

    private LimitUse(double? percent, double nearPercent, bool advisory)
    {
        Percent = percent;
        NearPercent = nearPercent;
        Advisory = advisory;
    }

    /// <summary>Null when no sample could be judged.</summary>
    public double? Percent { get; }
    public double NearPercent { get; }
    public bool Advisory { get; }

    public static LimitUse NotAssessable { get; } = new(null, DefaultNearPercent, false);

    public static LimitUse Of(double? percent, double nearPercent = DefaultNearPercent, bool advisory = false) => new(percent, nearPercent, advisory);

    public LimitUseBand Band => Percent switch
    {
        null => LimitUseBand.NotAssessable,
        { } use when !(use <= PassCeilingPercent) => LimitUseBand.Over,
        { } use when use >= NearPercent => LimitUseBand.Near,
        { } use when use >= NearPercent * 0.75 => LimitUseBand.Step3,
        { } use when use >= NearPercent * 0.5 => LimitUseBand.Step2,
        { } use when use >= NearPercent * 0.25 => LimitUseBand.Step1,
        _ => LimitUseBand.Step0,
    };

    /// <summary>Never rounds a failing use down to "100 %", nor a passing one up beyond it.</summary>
    public string Text => Percent switch
    {
        null => "not assessable",
        { } use when !(use <= LargestShownPercent) => ">999 %",
        { } use when !(use <= PassCeilingPercent) => Over(use),
        { } use => Math.Min(100, Math.Round(use, MidpointRounding.AwayFromZero)).ToString("0", CultureInfo.InvariantCulture) + " %",
    };

    /// <summary>Says without colour what the colour says.</summary>
    public string Sign => Band switch
    {
        LimitUseBand.Over => "▲",
        LimitUseBand.Near => "◆",
        LimitUseBand.NotAssessable => "–",
        _ => "",
    };

    public string Meaning => (Band, Advisory) switch
    {
        (LimitUseBand.Over, false) => "over the limit",
        (LimitUseBand.Over, true) => "over its advisory threshold",
        (LimitUseBand.Near, _) => "near the limit",
        (LimitUseBand.NotAssessable, _) => "no sample could be judged",
        _ => "within the limit",
    };

    public string CssClass => Band switch
    {
        LimitUseBand.Over => "use-over",
        LimitUseBand.Near => "use-near",
        LimitUseBand.NotAssessable => "use-none",
        LimitUseBand.Step3 => "use-3",
        LimitUseBand.Step2 => "use-2",
        LimitUseBand.Step1 => "use-1",
        _ => "use-0",
    };

    private static string Over(double use)
    {
        var whole = Math.Round(use, MidpointRounding.AwayFromZero);
        return whole > 100 ? whole.ToString("0", CultureInfo.InvariantCulture) + " %" : ">100 %";
    }
}
