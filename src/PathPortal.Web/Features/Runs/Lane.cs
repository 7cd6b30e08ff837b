namespace PathPortal.Web.Features.Runs;

/// <summary>One chart of the run page. Travels to the circuit as JSON.</summary>
/// <param name="Logarithmic">A logarithmic value axis.</param>
/// <param name="FromZero">The value axis starts at zero.</param>
public sealed record Lane(
    string Id, string Title, string Unit, IReadOnlyList<LaneLine> Lines, IReadOnlyList<LaneLimit> Limits, bool FromZero = true, bool Logarithmic = false);
