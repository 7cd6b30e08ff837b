namespace PathPortal.Engine.Arms;

/// <summary>
/// Limits of one joint, SI. A limit that is null was not given: the criterion that needs it is then not assessable, never passed.
/// </summary>
public sealed record JointLimits
{
    /// <summary>Smallest joint value (rad or m).</summary>
    public Limit? Low { get; init; }

    /// <summary>Largest joint value (rad or m).</summary>
    public Limit? High { get; init; }

    /// <summary>True for a revolute joint that may turn without end; then <see cref="Low"/> and <see cref="High"/> are null.</summary>
    public bool Continuous { get; init; }

    /// <summary>Largest absolute speed (rad/s or m/s), above zero.</summary>
    public Limit? Speed { get; init; }

    /// <summary>Largest absolute acceleration (rad/s² or m/s²), above zero.</summary>
    public Limit? Acceleration { get; init; }

    /// <summary>Largest absolute jerk (rad/s³ or m/s³), above zero. Kept with the model; no criterion uses it yet.</summary>
    public Limit? Jerk { get; init; }
}
