using PathPortal.Engine.Control;

namespace PathPortal.Engine.Paths;

/// <summary>Tool-space motion from one stop to the next: pieces joined without a jump in direction, and one time law over their whole length. Immutable.</summary>
internal sealed class ToolChain
{
    private readonly ChainPiece[] pieces;
    private readonly double[] starts;
    private readonly ChainLaw law;

    public ToolChain(IReadOnlyList<ChainPiece> pieces, ControllerSettings controller)
    {
        this.pieces = [.. pieces];
        starts = new double[this.pieces.Length];
        var length = 0.0;
        for (var i = 0; i < starts.Length; i++)
        {
            starts[i] = length;
            length += this.pieces[i].Length;
        }

        var stretches = Array.ConvertAll(this.pieces, p => p.Stretch);
        law = controller.TimeLaw == TimeLaw.Trapezoidal
            ? StagedChainLaw.Plan(stretches)
            : PolynomialChainLaw.Plan(controller.TimeLaw, length, stretches.Min(s => s.Speed), stretches.Min(s => s.Acceleration));
    }

    /// <summary>Time from stop to stop (s).</summary>
    public double Duration => law.Duration;

    /// <summary>Where the reference is at a time since the chain's start (s); held at the ends outside.</summary>
    public ReferenceState At(double time)
    {
        var value = law.At(time);
        var (low, high) = (0, pieces.Length - 1);
        while (low < high)
        {
            var middle = (low + high + 1) / 2;
            (low, high) = starts[middle] <= value.Value ? (middle, high) : (low, middle - 1);
        }

        var place = pieces[low].At(Math.Min(value.Value - starts[low], pieces[low].Length));
        return new(place, value.First * place.Tangent, value.First * place.TurnRate);
    }
}
