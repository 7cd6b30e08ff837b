using System.Runtime.CompilerServices;
using PathPortal.Engine.Control;

namespace PathPortal.Engine.Stepping;

/// <summary>
/// From what the loop asks for to the command: path rate f, speed limit w = s_v q̇, acceleration limit v ← v + s_a (w − v),
/// s_a = min(1, min a_i T/|w_i − v_i|). Demands are kept as they were before.
/// </summary>
internal static unsafe class LimitStage
{
    // A demand this close above its limit is at the limit: rounding of the factor that brought it there.
    private const double AtLimit = 1 + 1e-9;

    [MethodImpl(MethodImplOptions.NoInlining)]
    public static void Run<T>(LoopSetup setup, LoopWorkspace<T> w)
        where T : unmanaged, ILane<T>
    {
        Demand(setup, w);
        SpeedLimit(setup, w);
        AccelerationLimit(setup, w);
        if (setup.Controller.LimitReaction == LimitReaction.Stop)
        {
            FindBeyond(setup, w);
        }
    }

    [MethodImpl(MethodImplOptions.NoInlining)]
    private static void Demand<T>(LoopSetup setup, LoopWorkspace<T> w)
        where T : unmanaged, ILane<T>
    {
        var controller = setup.Controller;
        var slows = controller.LimitReaction == LimitReaction.SlowPath;
        var rate = slows ? PathRate(setup, w) : T.Of(1);
        *w.PathRate = rate;
        var fed = controller.Feedforward != Feedforward.None;
        var finite = T.Abs(*w.TrueDistance) <= T.Of(double.MaxValue);
        for (var i = 0; i < setup.JointCount; i++)
        {
            w.Demand[i] = fed ? w.Feedback[i] + w.Forward[i] : w.Feedback[i];
            w.Limited[i] = !fed ? w.Feedback[i]
                : slows ? T.PlusProduct(rate, w.Forward[i], w.Feedback[i]) : w.Demand[i];
            finite &= T.Abs(w.Demand[i]) <= T.Of(double.MaxValue);
        }

        *w.NotFinite = ~finite;
    }

    // The largest f in [0, 1] with |feedback + f forward| ≤ limit for every joint, and, where acceleration is limited too, with
    // |feedback + f forward − v| ≤ a T.
    [MethodImpl(MethodImplOptions.NoInlining)]
    private static T PathRate<T>(LoopSetup setup, LoopWorkspace<T> w)
        where T : unmanaged, ILane<T>
    {
        var controller = setup.Controller;
        var rate = T.Of(1);
        for (var i = 0; i < setup.JointCount; i++)
        {
            var size = T.Abs(w.Forward[i]);
            if (controller.LimitsSpeed)
            {
                var against = T.Of(setup.SpeedLimit[i]) - T.CopySign(T.Of(1), w.Forward[i]) * w.Feedback[i];
                rate = T.Min(against / size, rate);
            }

            if (controller.LimitsAcceleration)
            {
                var rest = T.CopySign(T.Of(1), w.Forward[i]) * (w.Feedback[i] - w.Command[i]);
                rate = T.Min((T.Of(setup.AccelerationLimit[i] * controller.Period) - rest) / size, rate);
            }
        }

        return T.Max(rate, T.Of(0));
    }

    [MethodImpl(MethodImplOptions.NoInlining)]
    private static void SpeedLimit<T>(LoopSetup setup, LoopWorkspace<T> w)
        where T : unmanaged, ILane<T>
    {
        var scale = T.Of(1);
        if (setup.Controller.LimitsSpeed)
        {
            for (var i = 0; i < setup.JointCount; i++)
            {
                scale = T.Min(T.Of(setup.SpeedLimit[i]) / T.Abs(w.Limited[i]), scale);
            }

            var common = setup.Controller.SpeedLimiter == SpeedLimiter.CommonScaling;
            for (var i = 0; i < setup.JointCount; i++)
            {
                w.Limited[i] = common
                    ? scale * w.Limited[i]
                    : T.CopySign(T.Min(T.Of(setup.SpeedLimit[i]), T.Abs(w.Limited[i])), w.Limited[i]);
            }
        }

        *w.SpeedScale = scale;
    }

    [MethodImpl(MethodImplOptions.NoInlining)]
    private static void AccelerationLimit<T>(LoopSetup setup, LoopWorkspace<T> w)
        where T : unmanaged, ILane<T>
    {
        var period = setup.Controller.Period;
        var inverse = T.Of(1 / period);
        var scale = T.Of(1);
        for (var i = 0; i < setup.JointCount; i++)
        {
            var change = w.Limited[i] - w.Command[i];
            w.AccelerationDemand[i] = inverse * change;
            scale = T.Min(T.Of(setup.AccelerationLimit[i] * period) / T.Abs(change), scale);
        }

        if (!setup.Controller.LimitsAcceleration)
        {
            scale = T.Of(1);
        }

        var whole = scale >= T.Of(1);
        for (var i = 0; i < setup.JointCount; i++)
        {
            var part = T.PlusProduct(scale, w.Limited[i] - w.Command[i], w.Command[i]);
            w.Command[i] = T.Select(whole, w.Limited[i], part);
        }
    }

    [MethodImpl(MethodImplOptions.NoInlining)]
    private static void FindBeyond<T>(LoopSetup setup, LoopWorkspace<T> w)
        where T : unmanaged, ILane<T>
    {
        var beyond = T.Of(0);
        for (var i = 0; i < setup.JointCount; i++)
        {
            if (setup.Controller.LimitsSpeed)
            {
                beyond |= T.Abs(w.Demand[i]) > T.Of(AtLimit * setup.SpeedLimit[i]);
            }

            if (setup.Controller.LimitsAcceleration)
            {
                beyond |= T.Abs(w.AccelerationDemand[i]) > T.Of(AtLimit * setup.AccelerationLimit[i]);
            }
        }

        *w.BeyondLimit = beyond;
    }
}
