namespace PathPortal.Portal.Jobs;

/// <summary>Whether somebody waits for a run.</summary>
public enum RunPriority
{
    /// <summary>Somebody uploaded or asked and is looking at the page.</summary>
    Interactive,

    /// <summary>Re-checks after a change of setup or criteria; must not hold up the others.</summary>
    Bulk,
}
