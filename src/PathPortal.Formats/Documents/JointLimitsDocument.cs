namespace PathPortal.Formats.Documents;

/// <summary>Limits of one joint; null: not given, and then the criterion that needs it is not assessable.</summary>
public sealed record JointLimitsDocument
{
    /// <summary>True for a revolute joint that turns without end; then low and high are null.</summary>
    public bool Continuous { get; set; }

    public LimitDocument? Low { get; set; }

    public LimitDocument? High { get; set; }

    public LimitDocument? Speed { get; set; }

    public LimitDocument? Acceleration { get; set; }

    public LimitDocument? Jerk { get; set; }
}
