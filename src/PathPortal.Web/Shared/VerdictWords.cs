using PathPortal.Engine.Verdicts;

namespace PathPortal.Web.Shared;

public static class VerdictWords
{
    public static string InAWord(Verdict verdict) => verdict switch
    {
        Verdict.Pass => "passes",
        Verdict.Fail => "fails",
        _ => "not assessable",
    };

    public static string Sentence(Verdict verdict) => verdict switch
    {
        Verdict.Pass => "The cell can follow the path within every criterion asked for.",
        Verdict.Fail => "At least one criterion fails.",
        _ => "Nothing fails, but a criterion that is asked for could not be judged.",
    };
}
