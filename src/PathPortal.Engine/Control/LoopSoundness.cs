using System.Globalization;
using PathPortal.Engine.Geometry;

namespace PathPortal.Engine.Control;

/// <summary>
/// Stability of the sampled loop of gain, servo lag and delay. All joints share one servo and one delay and J J⁺ is the identity, so the loop of a
/// small error is this scalar loop in every direction; damping only lowers its gain. Left out: motion of the Jacobian within the delay, null-space
/// motion, limits.
/// </summary>
internal static class LoopSoundness
{
    /// <summary>A loop is sound when its gain could be this many times larger before it turns unstable.</summary>
    public const double RequiredMargin = 2;

    /// <summary>
    /// The gain (1/s) at which the loop turns unstable: 2 sin(π/(2(2d+1)))/T without lag (Levin and May 1976); with lag and without delay the Jury
    /// limit of z² + (K b₁ − 1 − p) z + p + K b₀; in general the gain of K P(z) z⁻ᵈ, P = (b₁ z + b₀)/((z − 1)(z − p)), where its phase first passes
    /// half a turn.
    /// </summary>
    public static double GainLimit(ControllerSettings controller)
    {
        var T = controller.Period;
        var commanded = controller.Feedback == FeedbackSource.Commanded;
        var tau = commanded ? 0 : controller.ServoTimeConstant;
        var delay = commanded ? 0 : controller.MeasurementDelay + controller.CommandDelay;

        // Phase falls from a quarter turn at ω = 0 and is past a half at ω T = π; bisection finds where.
        var (low, high) = (0.0, Math.PI);
        for (var i = 0; i < 60; i++)
        {
            var middle = 0.5 * (low + high);
            (low, high) = PhaseLag(middle, T, tau, delay) < Math.PI ? (middle, high) : (low, middle);
        }

        return 1 / Plant(low, T, tau).Size;
    }

    /// <summary>Whether the loop is sound, and in words why not.</summary>
    public static (bool Sound, string? Reason) Judge(ControllerSettings controller)
    {
        var limit = GainLimit(controller);
        var gain = Math.Max(controller.PositionGain, controller.OrientationGain);
        return RequiredMargin * gain <= limit * (1 + 1e-12)
            ? (true, null)
            : (false, string.Create(
                CultureInfo.InvariantCulture,
                $"The loop gain of {gain:0.###} 1/s is more than half of {limit:0.###} 1/s, where lag and delay make the loop unstable."));
    }

    private static double PhaseLag(double angle, double T, double tau, int delay) => Plant(angle, T, tau).Lag + delay * angle;

    // Size and phase lag, made continuous, of the plant at z = e^{jω}.
    private static (double Size, double Lag) Plant(double angle, double T, double tau)
    {
        var (sin, cos) = Deterministic.SinCos(angle);

        // 1/(z − 1): size 1/(2 sin(ω/2)), lag π/2 + ω/2.
        var half = Deterministic.Sin(0.5 * angle);
        if (tau == 0)
        {
            return (T / (2 * half), 0.5 * Math.PI + 0.5 * angle);
        }

        var p = Deterministic.Exp(-T / tau);
        var b1 = T - tau * (1 - p);
        var b0 = tau * (1 - p) - T * p;
        var (zeroSize, zeroLead) = Polar(b1 * cos + b0, b1 * sin);
        var (poleSize, poleLag) = Polar(cos - p, sin);
        return (zeroSize / (2 * half * poleSize), 0.5 * Math.PI + 0.5 * angle + poleLag - zeroLead);
    }

    private static (double Size, double Angle) Polar(double x, double y) => (Math.Sqrt(x * x + y * y), Deterministic.Atan2(y, x));
}
