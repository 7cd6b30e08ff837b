using PathPortal.Engine;
using PathPortal.Engine.Verdicts;
using PathPortal.Web.Shared;

namespace PathPortal.Web.Features.Runs.Samples;

/// <summary>What the picture of arm and path needs at once: postures and positions at evenly spread samples, and the worst use between them.</summary>
public static class ScenePacker
{
    public const int MaxFrames = 1500;
    private const int MaxMarks = 400;

    public static byte[] Pack(RunMaterial run)
    {
        var s = run.Samples;
        var frames = Frames(s.Count);
        var packed = new PackedSamples();
        packed.AddSamples("frame", frames);
        for (var j = 0; j < s.JointCount; j++)
            packed.AddValues($"q{j}", At(frames, s.Joints[j]));
        for (var axis = 0; axis < 3; axis++)
        {
            packed.AddValues($"tool.{"xyz"[axis]}", At(frames, s.ToolPosition[axis]));
            packed.AddValues($"reference.{"xyz"[axis]}", At(frames, s.ReferencePosition[axis]));
        }
        packed.AddValues("path", At(frames, s.PathFraction));
        foreach (var (criterion, use) in s.Use.OrderBy(u => u.Key))
            packed.AddValues(SampleColumns.UseName(criterion), Worst(frames, use));
        return packed.ToBytes(new
        {
            period = s.Period,
            count = s.Count,
            drawing = ArmDrawing.Of(run.Scenario.Arm, run.Scenario.Cell),
            marks = Marks(run),
        });
    }

    /// <summary>First and last sample and evenly spread ones between them.</summary>
    public static int[] Frames(int count)
    {
        var frames = Math.Min(count, MaxFrames);
        return [.. Enumerable.Range(0, frames).Select(i => frames == 1 ? 0 : (int)((long)i * (count - 1) / (frames - 1)))];
    }

    private static float[] At(int[] frames, double[] values) => [.. frames.Select(k => (float)values[k])];

    /// <summary>The largest use from each frame up to and including the next: no peak falls between two frames.</summary>
    private static float[] Worst(int[] frames, double[] use)
    {
        var worst = new float[frames.Length];
        for (var i = 0; i < frames.Length; i++)
        {
            var value = double.NaN;
            var last = i + 1 < frames.Length ? frames[i + 1] : frames[i];
            for (var k = frames[i]; k <= last; k++)
                if (double.IsNaN(value) || use[k] > value)
                    value = use[k];
            worst[i] = (float)value;
        }
        return worst;
    }

    /// <summary>Where the tool passes waypoints: every one of a short path, the labelled ones of a long path.</summary>
    private static List<object> Marks(RunMaterial run)
    {
        var points = run.Scenario.Path.Waypoints;
        var onlyLabelled = points.Length > MaxMarks;
        var marks = new List<object>();
        var s = run.Samples;
        for (var k = 0; k < s.Count && marks.Count < MaxMarks; k++)
        {
            var passed = k == 0 ? 0 : s.Waypoint[k] > s.Waypoint[k - 1] ? s.Waypoint[k] - 1 : k == s.Count - 1 ? s.Waypoint[k] : -1;
            if (passed >= 0 && passed < points.Length && !(onlyLabelled && points[passed].Label.Length == 0))
                marks.Add(new { sample = k, waypoint = passed, label = points[passed].Label });
        }
        return marks;
    }
}
