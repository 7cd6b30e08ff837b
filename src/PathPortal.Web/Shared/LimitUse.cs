using System.Globalization;
using PathPortal.Engine.Verdicts;

namespace PathPortal.Web.Shared;

/// <summary>How a limit use reads and looks, the same at every zoom. As in the engine, 1 is exactly at the limit.</summary>
public readonly record struct LimitUse
{
    /// <summary>Up to here a use passes: 100 % and the engine's 1e-7 %.</summary>
    public const double PassCeiling = 1 + 1e-9;

    private const double LargestShown = 9.99;

    private LimitUse(double? use, double near, bool advisory)
    {
        Use = use;
        Near = near;
        Advisory = advisory;
    }

    /// <summary>Null when no sample could be judged.</summary>
    public double? Use { get; }

    /// <summary>From here on it counts as near the limit.</summary>
    public double Near { get; }

    /// <summary>True where it advises and does not decide the verdict.</summary>
    public bool Advisory { get; }

    public static LimitUse NotAssessable => Of((double?)null);

    public static LimitUse Of(double? use, double near = CriteriaSheet.DefaultNear, bool advisory = false) => new(use, near, advisory);

    /// <summary>The worst use of a criterion. A yes/no criterion that fails has no share of a limit; it reads as over it.</summary>
    public static LimitUse Of(CriterionOutcome outcome) => new(
        outcome.WorstUse ?? (outcome.Status == CriterionStatus.Fail ? double.PositiveInfinity : null), outcome.NearThreshold, !outcome.Binding);

    public LimitUseBand Band => Use switch
    {
        null => LimitUseBand.NotAssessable,
        { } use when !(use <= PassCeiling) => LimitUseBand.Over,
        { } use when use >= Near => LimitUseBand.Near,
        { } use when use >= Near * 0.75 => LimitUseBand.Step3,
        { } use when use >= Near * 0.5 => LimitUseBand.Step2,
        { } use when use >= Near * 0.25 => LimitUseBand.Step1,
        _ => LimitUseBand.Step0,
    };

    /// <summary>Never rounds a failing use down to "100 %", nor a near one up to it.</summary>
    public string Text => Use switch
    {
        null => "not assessable",
        { } use when !(use <= LargestShown) => ">999 %",
        { } use when !(use <= PassCeiling) => Over(use),
        { } use => Within(use),
    };

    /// <summary>Says without colour what the colour says.</summary>
    public string Sign => Band switch
    {
        LimitUseBand.Over => "▲",
        LimitUseBand.Near => "◆",
        _ => "",
    };

    public string Meaning => (Band, Advisory) switch
    {
        (LimitUseBand.Over, false) => "over the limit",
        (LimitUseBand.Over, true) => "beyond what is advised; does not decide the verdict",
        (LimitUseBand.NotAssessable, _) => "no sample could be judged",
        (LimitUseBand.Near, false) => "near the limit",
        (LimitUseBand.Near, true) => "near what is advised; does not decide the verdict",
        (_, true) => "advisory; does not decide the verdict",
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

    private static string Over(double use) => Percent(use) is var whole && whole > 100 ? Written(whole) : ">100 %";

    private static string Within(double use) => use < 0.9995 && Percent(use) >= 100 ? ">99 %" : Written(Math.Min(100, Percent(use)));

    private static double Percent(double use) => Math.Round(use * 100, MidpointRounding.AwayFromZero);

    private static string Written(double percent) => percent.ToString("0", CultureInfo.InvariantCulture) + " %";
}
