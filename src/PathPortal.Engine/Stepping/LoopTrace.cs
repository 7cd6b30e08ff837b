using System.Buffers;
using System.Runtime.CompilerServices;

namespace PathPortal.Engine.Stepping;

/// <summary>
/// What a group of simulations leaves behind, step by step: channels × lanes in chunks from a shared pool, given back on disposal. Not safe between
/// threads.
/// </summary>
internal sealed class LoopTrace(int joints, int width) : IDisposable
{
    /// <summary>Channels of the reference, in the order of <see cref="LoopWorkspace{T}.Echo"/>.</summary>
    public const int EchoCount = 12;

    public const int EchoPoint = 0;
    public const int EchoOrientation = 3;
    public const int EchoSpeed = 7;
    public const int EchoTime = 8;
    public const int EchoWaypoint = 9;
    public const int EchoTravel = 10;
    public const int EchoMove = 11;

    private const int StepsInChunk = 256;

    private readonly List<double[]> chunks = [];

    /// <summary>First channel of the joint values.</summary>
    public const int Joints = 0;

    public int Speeds => joints;

    public int Demands => 2 * joints;

    public int AccelerationDemands => 3 * joints;

    public int Echo => 4 * joints;

    public int ToolPoint => Echo + EchoCount;

    public int ToolRotation => ToolPoint + 3;

    public int Distance => ToolRotation + 9;

    public int Turn => Distance + 1;

    public int SigmaMin => Distance + 2;

    public int SigmaMax => Distance + 3;

    public int DampingSquared => Distance + 4;

    public int SpeedScale => Distance + 5;

    public int PathRate => Distance + 6;

    public int ToolSpeed => Distance + 7;

    private int Channels => Distance + 8;

    // Chunk by chunk, then channel by channel: writing a step touches each channel once, reading a channel runs straight through memory.
    private int ChannelSize => StepsInChunk * width;

    /// <summary>One number of one lane at one step.</summary>
    public double At(int step, int channel, int lane) =>
        chunks[step / StepsInChunk][channel * ChannelSize + step % StepsInChunk * width + lane];

    /// <summary>Copies one channel of one lane.</summary>
    public void Copy(int channel, int lane, Span<double> to)
    {
        for (var first = 0; first < to.Length; first += StepsInChunk)
        {
            var from = chunks[first / StepsInChunk].AsSpan(channel * ChannelSize, ChannelSize);
            var part = to[first..Math.Min(first + StepsInChunk, to.Length)];
            for (var i = 0; i < part.Length; i++)
            {
                part[i] = from[i * width + lane];
            }
        }
    }

    [MethodImpl(MethodImplOptions.NoInlining)]
    public unsafe void Record<T>(LoopWorkspace<T> w, int step)
        where T : unmanaged, ILane<T>
    {
        if (step / StepsInChunk == chunks.Count)
        {
            chunks.Add(ArrayPool<double>.Shared.Rent(Channels * ChannelSize));
        }

        fixed (double* start = &chunks[step / StepsInChunk][step % StepsInChunk * width])
        {
            var to = (T*)start;
            to = Put(w.Joints, joints, to);
            to = Put(w.Speed, joints, to);
            to = Put(w.Demand, joints, to);
            to = Put(w.AccelerationDemand, joints, to);
            to = Put(w.Echo, EchoCount, to);
            to = Put(w.True.Point, 3, to);
            to = Put(w.True.Rotation, 9, to);
            to = Put(w.TrueDistance, 1, to);
            to = Put(w.TrueTurn, 1, to);
            to = Put(w.SigmaMin, 1, to);
            to = Put(w.SigmaMax, 1, to);
            to = Put(w.DampingSquared, 1, to);
            to = Put(w.SpeedScale, 1, to);
            to = Put(w.PathRate, 1, to);
            Put(w.ToolSpeed, 1, to);
        }
    }

    public void Dispose()
    {
        foreach (var chunk in chunks)
        {
            ArrayPool<double>.Shared.Return(chunk);
        }

        chunks.Clear();
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static unsafe T* Put<T>(T* from, int count, T* to)
        where T : unmanaged
    {
        for (var i = 0; i < count; i++)
        {
            to[i * StepsInChunk] = from[i];
        }

        return to + count * StepsInChunk;
    }
}
