namespace PathPortal.Engine.Paths;

/// <summary>How the tool runs along the arc length between two stops.</summary>
public enum TimeLaw
{
    /// <summary>s = 3u² − 2u³: rest to rest, peak speed 1.5 D/T.</summary>
    Cubic,

    /// <summary>s = 10u³ − 15u⁴ + 6u⁵: rest to rest with zero end acceleration, peak speed 1.875 D/T.</summary>
    Quintic,

    /// <summary>Constant acceleration, cruise at programmed speed, constant deceleration.</summary>
    Trapezoidal,
}
