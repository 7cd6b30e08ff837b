namespace PathPortal.Portal.Jobs;

/// <summary>Keeps the last share the engine reported, for another thread to read.</summary>
internal sealed class LatestProgress : IProgress<double>
{
    private double _value;

    public double Value => Volatile.Read(ref _value);

    public void Report(double value) => Volatile.Write(ref _value, Math.Clamp(value, 0, 1));
}
