namespace PathPortal.Engine.Control;

/// <summary>The law of the damping factor.</summary>
public enum DampingKind
{
    /// <summary>No damping: pseudo-inverse; beyond condition 1e7 the run stops with a status.</summary>
    None,

    /// <summary>The same λ everywhere.</summary>
    Constant,

    /// <summary>λ² = λ²_max (1 − (σ_min/ε)²) below ε, else 0 (Maciejewski and Klein 1988; Chiaverini, Siciliano and Egeland 1994).</summary>
    Variable,
}
