namespace PathPortal.Engine.Verdicts;

/// <summary>Outcome of one criterion over a run.</summary>
public enum CriterionStatus
{
    /// <summary>Use stays below the near threshold.</summary>
    Pass,

    /// <summary>Use reaches the near threshold and stays at or below 100 %.</summary>
    Near,

    /// <summary>Use above 100 %, a passed hard limit, or a value that is not finite.</summary>
    Fail,

    /// <summary>No sample to judge by, or the limit is not given.</summary>
    NotAssessable,

    /// <summary>The criteria sheet does not ask for it.</summary>
    NotAsked,
}
