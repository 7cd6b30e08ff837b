using System.Globalization;

namespace PathPortal.Engine.Paths;

/// <summary>Why a path can't be planned, at one of its waypoints.</summary>
/// <param name="Waypoint">Index from 0.</param>
/// <param name="SourceLine">Line of the source from 1; 0 where the path comes from no file.</param>
/// <param name="Quantity">What is wrong: "corner reach".</param>
/// <param name="Value">The value found, SI.</param>
/// <param name="Unit">Its unit.</param>
/// <param name="Expected">What it should be: "must be at most 0.002 m".</param>
public sealed record PlanProblem(int Waypoint, int SourceLine, string Quantity, double Value, string Unit, string Expected)
{
    /// <summary>One sentence without a closing stop, waypoints counted from 1: "waypoint 3 (line 5), corner reach: 0.02 m, must be at most 0.01 m".</summary>
    public override string ToString()
    {
        var line = SourceLine > 0 ? string.Create(CultureInfo.InvariantCulture, $" (line {SourceLine})") : "";
        return string.Create(CultureInfo.InvariantCulture, $"waypoint {Waypoint + 1}{line}, {Quantity}: {InputText.Of(Value)} {Unit}, {Expected}");
    }
}
