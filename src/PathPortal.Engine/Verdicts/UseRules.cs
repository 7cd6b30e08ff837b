namespace PathPortal.Engine.Verdicts;

/// <summary>What a use of a limit means.</summary>
public static class UseRules
{
    /// <summary>Pass means use at most 1 plus this: 1e-7 %, far below anything measurable, far above rounding.</summary>
    public const double Slack = 1e-9;

    /// <summary>True where the criterion holds. NaN does not.</summary>
    public static bool Passes(double use) => use <= 1 + Slack;

    /// <summary>Pass, near or fail, for a use that is present.</summary>
    public static CriterionStatus StatusOf(double use, double near) =>
        !Passes(use) ? CriterionStatus.Fail : use >= near ? CriterionStatus.Near : CriterionStatus.Pass;

    /// <summary>True where a use is present and larger than another, or the other is absent (NaN).</summary>
    internal static bool IsWorse(double use, double other) => !double.IsNaN(use) && !(use <= other);

    /// <summary>The larger of two uses; absent ones don't count.</summary>
    internal static double Worse(double a, double b) => IsWorse(b, a) ? b : a;
}
