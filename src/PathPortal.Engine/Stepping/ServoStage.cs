using System.Runtime.CompilerServices;

namespace PathPortal.Engine.Stepping;

/// <summary>
/// The arm between two samples, exactly: with command a held over T, an ideal integrator gives q ← q + T a; a first-order servo τ s′ = a − s gives
/// q ← q + T a + (s − a) τ (1 − p), s ← a + (s − a) p with p = exp(−T/τ). Delays are rings of whole periods.
/// </summary>
internal static unsafe class ServoStage
{
    /// <summary>Lets the delayed measurement in; before there is one the start posture is seen.</summary>
    [MethodImpl(MethodImplOptions.NoInlining)]
    public static T* Measure<T>(LoopSetup setup, LoopWorkspace<T> w, int step)
        where T : unmanaged, ILane<T>
    {
        var n = setup.JointCount;
        var slot = w.MeasurementRing + n * (step % w.MeasurementSlots);
        for (var i = 0; i < n; i++)
        {
            slot[i] = w.Joints[i];
        }

        return w.MeasurementRing + n * ((step + 1) % w.MeasurementSlots);
    }

    /// <summary>The command that acts from this sample on, and with it the joint speeds of this sample.</summary>
    [MethodImpl(MethodImplOptions.NoInlining)]
    public static T* Act<T>(LoopSetup setup, LoopWorkspace<T> w, int step)
        where T : unmanaged, ILane<T>
    {
        var n = setup.JointCount;
        var slot = w.CommandRing + n * (step % w.CommandSlots);
        for (var i = 0; i < n; i++)
        {
            slot[i] = w.Command[i];
        }

        var acting = w.CommandRing + n * ((step + 1) % w.CommandSlots);
        var ideal = setup.Controller.ServoTimeConstant == 0;
        for (var i = 0; i < n; i++)
        {
            w.Speed[i] = ideal ? acting[i] : w.ServoSpeed[i];
        }

        ToolSpeed(setup, w);
        return acting;
    }

    [MethodImpl(MethodImplOptions.NoInlining)]
    public static void Advance<T>(LoopSetup setup, LoopWorkspace<T> w, T* acting)
        where T : unmanaged, ILane<T>
    {
        var period = T.Of(setup.Controller.Period);
        var tau = setup.Controller.ServoTimeConstant;
        for (var i = 0; i < setup.JointCount; i++)
        {
            w.Commanded[i] = T.PlusProduct(period, w.Command[i], w.Commanded[i]);
            w.Joints[i] = T.PlusProduct(period, acting[i], w.Joints[i]);
            if (tau > 0)
            {
                var lag = w.ServoSpeed[i] - acting[i];
                w.Joints[i] = T.PlusProduct(lag, T.Of(tau * (1 - setup.ServoDecay)), w.Joints[i]);
                w.ServoSpeed[i] = T.PlusProduct(lag, T.Of(setup.ServoDecay), acting[i]);
            }
        }
    }

    // |Σ q̇_i (a_i × (p − o_i))|, for prismatic joints |Σ q̇_i a_i|, of the true arm.
    [MethodImpl(MethodImplOptions.NoInlining)]
    private static void ToolSpeed<T>(LoopSetup setup, LoopWorkspace<T> w)
        where T : unmanaged, ILane<T>
    {
        var (vx, vy, vz) = (T.Of(0), T.Of(0), T.Of(0));
        var p = w.True.Point;
        for (var i = 0; i < setup.JointCount; i++)
        {
            var a = w.True.Axis + 3 * i;
            var o = w.True.Origin + 3 * i;
            var s = w.Speed[i];
            if (setup.Prismatic[i])
            {
                (vx, vy, vz) = (T.PlusProduct(s, a[0], vx), T.PlusProduct(s, a[1], vy), T.PlusProduct(s, a[2], vz));
                continue;
            }

            var (rx, ry, rz) = (p[0] - o[0], p[1] - o[1], p[2] - o[2]);
            vx = T.PlusProduct(s, T.LessProduct(a[2], ry, a[1] * rz), vx);
            vy = T.PlusProduct(s, T.LessProduct(a[0], rz, a[2] * rx), vy);
            vz = T.PlusProduct(s, T.LessProduct(a[1], rx, a[0] * ry), vz);
        }

        *w.ToolSpeed = T.Sqrt(T.PlusProduct(vx, vx, T.PlusProduct(vy, vy, vz * vz)));
    }
}
