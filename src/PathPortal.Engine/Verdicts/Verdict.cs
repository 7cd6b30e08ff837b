namespace PathPortal.Engine.Verdicts;

/// <summary>What a run says about a revision on a cell.</summary>
public enum Verdict
{
    /// <summary>Every binding criterion that is asked for was judged and holds.</summary>
    Pass,

    /// <summary>At least one binding criterion fails.</summary>
    Fail,

    /// <summary>Nothing fails, but a binding criterion that is asked for could not be judged.</summary>
    NotAssessable,
}
