namespace PathPortal.Engine.Paths;

/// <summary>How far along a chain the reference is at a time since the chain's start: from rest at 0 to rest at its length. Immutable.</summary>
internal abstract class ChainLaw
{
    /// <summary>Time from rest to rest (s).</summary>
    public abstract double Duration { get; }

    /// <summary>s, ds/dt, d²s/dt² at a time (s); held at the ends outside.</summary>
    public abstract LawValue At(double time);
}
