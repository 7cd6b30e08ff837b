namespace PathPortal.Engine.Geometry;

/// <summary>The one place from which scalar code takes elementary functions.</summary>
internal static class Elementary
{
    public static (double Sin, double Cos) SinCos(double angle) => Deterministic.SinCos(angle);

    public static double Atan2(double y, double x) => Deterministic.Atan2(y, x);
}
