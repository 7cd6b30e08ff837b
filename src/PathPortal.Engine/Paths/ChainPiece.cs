namespace PathPortal.Engine.Paths;

/// <summary>A part of a chain with one formula: a straight, a rounded corner, a turn on the spot. Immutable.</summary>
internal abstract class ChainPiece
{
    /// <summary>Length along the chain (m, or rad for a turn on the spot), above zero.</summary>
    public abstract double Length { get; }

    /// <summary>The place at a length 0..<see cref="Length"/> from the piece's begin.</summary>
    public abstract PathPoint At(double s);

    /// <summary>Bounds of speed and acceleration on this piece.</summary>
    public abstract Stretch Stretch { get; }
}
