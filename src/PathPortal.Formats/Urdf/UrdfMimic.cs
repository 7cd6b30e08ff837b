namespace PathPortal.Formats.Urdf;

/// <summary>A joint that follows another: its value is <paramref name="Multiplier"/> times the other's plus <paramref name="Offset"/> (rad or m).</summary>
public sealed record UrdfMimic(string Follows, double Multiplier, double Offset);
