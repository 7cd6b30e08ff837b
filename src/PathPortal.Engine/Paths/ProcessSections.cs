using System.Collections.Immutable;

namespace PathPortal.Engine.Paths;

/// <summary>Where along the programmed travel the process runs, lead-ins left out. Immutable.</summary>
internal sealed class ProcessSections
{
    private readonly double[] from;

    private ProcessSections(double[] from) => this.from = from;

    public static ProcessSections Of(ToolPath path, ImmutableArray<Segment?> segments)
    {
        // Travel from which on the process counts, by segment; infinite where it is off.
        var from = new double[segments.Length];
        Array.Fill(from, double.PositiveInfinity);
        for (var i = 1; i < from.Length; i++)
        {
            if (segments[i] is { } segment && path.Waypoints[i].ProcessOn)
            {
                var goesOn = segments[i - 1] is not null && path.Waypoints[i - 1].ProcessOn;
                from[i] = goesOn ? from[i - 1] : segment.StartTravel + path.Waypoints[i].LeadIn;
            }
        }

        return new(from);
    }

    /// <summary>True where the process runs at a programmed travel (m) on the segment that ends at a waypoint.</summary>
    public bool IsOn(int waypoint, double travel) => travel >= from[waypoint];
}
