namespace PathPortal.Formats.Documents;

/// <summary>A pose as people write it; which frame in which is said by whoever holds it.</summary>
public sealed record PoseDocument
{
    public double XMm { get; set; }

    public double YMm { get; set; }

    public double ZMm { get; set; }

    public OrientationDocument Orientation { get; set; } = new();
}
