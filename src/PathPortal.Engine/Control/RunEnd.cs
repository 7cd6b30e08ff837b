namespace PathPortal.Engine.Control;

/// <summary>How one simulation ended.</summary>
internal enum RunEnd
{
    /// <summary>The reference came to the end of the path.</summary>
    Completed,

    /// <summary>The controller stopped at a joint limit, as it is set to.</summary>
    StoppedAtLimit,

    /// <summary>The undamped inverse passed condition 1e7.</summary>
    Singular,

    /// <summary>A value was not finite.</summary>
    NotFinite,

    /// <summary>The end of a joint move can't be reached.</summary>
    Unreachable,

    /// <summary>The controller slowed the path until it stood still.</summary>
    StoodStill,

    /// <summary>The run grew beyond the longest one allowed.</summary>
    TooLong,
}
