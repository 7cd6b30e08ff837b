namespace PathPortal.Engine.Verdicts;

/// <summary>
/// Orders the judgements of start postures, best first: by verdict (pass, not assessable, fail), then by worst use, then by how many binding criteria
/// fail, then by the sum of uses, which tells two postures apart that fail or pass alike. Uses count to six decimals: postures a whole turn apart
/// differ in the last bits and are no better for it.
/// </summary>
public sealed class PostureRanking : IComparer<Judgement>
{
    // A use beyond this says "hopeless" whatever its size; without the bound one infinite use would hide all others.
    private const double LargestCounted = 10;

    public static PostureRanking Instance { get; } = new();

    public int Compare(Judgement? x, Judgement? y)
    {
        ArgumentNullException.ThrowIfNull(x);
        ArgumentNullException.ThrowIfNull(y);
        var order = Rank(x.Verdict).CompareTo(Rank(y.Verdict));
        order = order != 0 ? order : Rounded(x.WorstUse).CompareTo(Rounded(y.WorstUse));
        order = order != 0 ? order : Failures(x).CompareTo(Failures(y));
        return order != 0 ? order : Sum(x).CompareTo(Sum(y));
    }

    private static int Rank(Verdict verdict) => verdict switch
    {
        Verdict.Pass => 0,
        Verdict.NotAssessable => 1,
        _ => 2,
    };

    private static int Failures(Judgement judgement) => judgement.Outcomes.Count(o => o is { Binding: true, Status: CriterionStatus.Fail });

    private static double Sum(Judgement judgement) => Rounded(
        judgement.Outcomes.Sum(o => Math.Min(LargestCounted, o.WorstUse ?? 0)));

    private static double Rounded(double use) => Math.Round(use, 6);
}
