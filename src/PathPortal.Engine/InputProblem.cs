using System.Globalization;

namespace PathPortal.Engine;

/// <summary>One thing that is wrong with what a simulation is asked to run on.</summary>
/// <param name="Place">Where, for people: "joint 3", "waypoint 12", "controller".</param>
/// <param name="Quantity">What: "speed limit", "position x".</param>
/// <param name="Value">The value found, SI; null where there is none.</param>
/// <param name="Unit">Its unit: "m", "rad/s", "1"; empty where there is none.</param>
/// <param name="Expected">What it should be: "must be above zero".</param>
public sealed record InputProblem(string Place, string Quantity, double? Value, string Unit, string Expected)
{
    /// <summary>The problem in one sentence, without a closing stop: "joint 3, speed limit: -2 rad/s, must be above zero".</summary>
    public override string ToString()
    {
        var unit = Unit is "" or "1" ? "" : " " + Unit;
        var value = Value is { } number ? string.Create(CultureInfo.InvariantCulture, $" {number}{unit},") : "";
        return $"{Place}, {Quantity}:{value} {Expected}";
    }
}
