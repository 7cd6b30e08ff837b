namespace PathPortal.Engine.Control;

/// <summary>What the controller does with the reference when joint speeds reach their limits.</summary>
public enum LimitReaction
{
    /// <summary>The reference keeps its time; the arm falls behind.</summary>
    KeepTime,

    /// <summary>The reference advances by the largest factor ≤ 1 that keeps every demand inside its limit.</summary>
    SlowPath,

    /// <summary>The controller stops; the path is not finished.</summary>
    Stop,
}
