namespace PathPortal.Portal.Simulation;

/// <summary>Which of a scenario's inputs something is about.</summary>
public enum ScenarioPart
{
    Path,
    Arm,
    Setup,
    Criteria,

    /// <summary>The assignment's terms: start posture and free turn.</summary>
    Terms,
}
