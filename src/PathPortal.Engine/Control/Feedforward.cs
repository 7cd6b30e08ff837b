namespace PathPortal.Engine.Control;

/// <summary>The reference velocity the loop adds to its correction, for the interval that starts at the sample.</summary>
public enum Feedforward
{
    None,

    /// <summary>Reference velocity at the start of the interval; costs aT/(2K) under acceleration a.</summary>
    Start,

    /// <summary>Reference velocity in the middle of the interval.</summary>
    Middle,

    /// <summary>Difference of the reference over the interval divided by T.</summary>
    Difference,
}
