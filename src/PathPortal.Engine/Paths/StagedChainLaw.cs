namespace PathPortal.Engine.Paths;

/// <summary>
/// The trapezoidal law over stretches that each have a speed and an acceleration of their own: as fast as these allow, constant acceleration or
/// constant speed at every moment, never above the speed of the stretch it is on. One pass forward bounds what can be reached from the start, one
/// pass back what can still be braked (Bobrow, Dubowsky and Gibson 1985, for constant bounds); the work is proportional to the number of stretches.
/// </summary>
internal sealed class StagedChainLaw : ChainLaw
{
    private readonly Stage[] stages;

    private StagedChainLaw(Stage[] stages, double duration) => (this.stages, Duration) = (stages, duration);

    public override double Duration { get; }

    public static StagedChainLaw Plan(IReadOnlyList<Stretch> stretches)
    {
        var n = stretches.Count;

        // Squared speeds at the joints between stretches; at rest at both ends.
        var squared = new double[n + 1];
        for (var i = 1; i < n; i++)
        {
            var lower = Math.Min(stretches[i - 1].Speed, stretches[i].Speed);
            squared[i] = Math.Min(lower * lower, squared[i - 1] + 2 * stretches[i - 1].Acceleration * stretches[i - 1].Length);
        }

        for (var i = n - 1; i > 0; i--)
        {
            squared[i] = Math.Min(squared[i], squared[i + 1] + 2 * stretches[i].Acceleration * stretches[i].Length);
        }

        var stages = new Stage[n];
        var (time, place) = (0.0, 0.0);
        for (var i = 0; i < n; i++)
        {
            stages[i] = Stage.Plan(stretches[i], time, place, squared[i], squared[i + 1]);
            time = stages[i].EndTime;
            place += stretches[i].Length;
        }

        return new(stages, time);
    }

    public override LawValue At(double time)
    {
        if (!(time > 0))
        {
            return new(0, 0, time == 0 ? stages[0].Acceleration : 0);
        }

        if (time >= Duration)
        {
            return new(stages[^1].End, 0, time > Duration ? 0 : -stages[^1].Acceleration);
        }

        var (low, high) = (0, stages.Length - 1);
        while (low < high)
        {
            var middle = (low + high + 1) / 2;
            (low, high) = stages[middle].StartTime <= time ? (middle, high) : (low, middle - 1);
        }

        return stages[low].At(time);
    }

    /// <summary>Speeds up at once, holds, slows down at last, over one stretch; any of the three may be missing.</summary>
    private readonly record struct Stage(
        double StartTime, double EndTime, double Start, double End, double EntrySpeed, double PeakSpeed, double ExitSpeed, double Acceleration)
    {
        public static Stage Plan(Stretch stretch, double startTime, double start, double entrySquared, double exitSquared)
        {
            var a = stretch.Acceleration;
            var peakSquared = Math.Min(stretch.Speed * stretch.Speed, a * stretch.Length + 0.5 * (entrySquared + exitSquared));
            peakSquared = Math.Max(peakSquared, Math.Max(entrySquared, exitSquared));
            var (entry, peak, exit) = (Math.Sqrt(entrySquared), Math.Sqrt(peakSquared), Math.Sqrt(exitSquared));
            var hold = Math.Max(0, stretch.Length - (2 * peakSquared - entrySquared - exitSquared) / (2 * a));
            var duration = (2 * peak - entry - exit) / a + hold / peak;
            return new(startTime, startTime + duration, start, start + stretch.Length, entry, peak, exit, a);
        }

        public LawValue At(double time)
        {
            var gone = time - StartTime;
            var rise = (PeakSpeed - EntrySpeed) / Acceleration;
            if (gone < rise)
            {
                return new(Start + gone * (EntrySpeed + 0.5 * Acceleration * gone), EntrySpeed + Acceleration * gone, Acceleration);
            }

            var left = EndTime - time;
            if (left < (PeakSpeed - ExitSpeed) / Acceleration)
            {
                return new(End - left * (ExitSpeed + 0.5 * Acceleration * left), ExitSpeed + Acceleration * left, -Acceleration);
            }

            var risen = rise * 0.5 * (EntrySpeed + PeakSpeed);
            return new(Start + risen + PeakSpeed * (gone - rise), PeakSpeed, 0);
        }
    }
}
