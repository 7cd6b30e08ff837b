using System.Runtime.CompilerServices;

namespace PathPortal.Engine.Stepping;

/// <summary>One double: the reference the wide lanes are compared with.</summary>
internal struct ScalarLane : ILane<ScalarLane>
{
    internal double V;

    public static int Width => 1;

    private static double AllBits => BitConverter.Int64BitsToDouble(-1);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static ScalarLane Of(double value) => new() { V = value };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static ScalarLane operator +(ScalarLane a, ScalarLane b) => new() { V = a.V + b.V };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static ScalarLane operator -(ScalarLane a, ScalarLane b) => new() { V = a.V - b.V };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static ScalarLane operator -(ScalarLane a) => new() { V = -a.V };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static ScalarLane operator *(ScalarLane a, ScalarLane b) => new() { V = a.V * b.V };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static ScalarLane operator /(ScalarLane a, ScalarLane b) => new() { V = a.V / b.V };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static ScalarLane PlusProduct(ScalarLane a, ScalarLane b, ScalarLane c) =>
        new() { V = Math.FusedMultiplyAdd(a.V, b.V, c.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static ScalarLane LessProduct(ScalarLane a, ScalarLane b, ScalarLane c) =>
        new() { V = Math.FusedMultiplyAdd(-a.V, b.V, c.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static ScalarLane Sqrt(ScalarLane a) => new() { V = Math.Sqrt(a.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static ScalarLane Abs(ScalarLane a) => new() { V = Math.Abs(a.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static ScalarLane Min(ScalarLane a, ScalarLane b) => new() { V = a.V < b.V ? a.V : b.V };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static ScalarLane Max(ScalarLane a, ScalarLane b) => new() { V = a.V > b.V ? a.V : b.V };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static ScalarLane CopySign(ScalarLane magnitude, ScalarLane sign) => new() { V = Math.CopySign(magnitude.V, sign.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static ScalarLane operator <(ScalarLane a, ScalarLane b) => new() { V = a.V < b.V ? AllBits : 0 };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static ScalarLane operator >(ScalarLane a, ScalarLane b) => new() { V = a.V > b.V ? AllBits : 0 };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static ScalarLane operator <=(ScalarLane a, ScalarLane b) => new() { V = a.V <= b.V ? AllBits : 0 };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static ScalarLane operator >=(ScalarLane a, ScalarLane b) => new() { V = a.V >= b.V ? AllBits : 0 };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static ScalarLane operator &(ScalarLane a, ScalarLane b) => FromBits(Bits(a) & Bits(b));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static ScalarLane operator |(ScalarLane a, ScalarLane b) => FromBits(Bits(a) | Bits(b));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static ScalarLane operator ~(ScalarLane a) => FromBits(~Bits(a));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static ScalarLane Select(ScalarLane mask, ScalarLane a, ScalarLane b) => Bits(mask) != 0 ? a : b;

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static ScalarLane HasBit(ScalarLane a, int bit) => FromBits(Bits(a) << (63 - bit) >> 63);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static bool Any(ScalarLane mask) => Bits(mask) != 0;

    private static long Bits(ScalarLane a) => BitConverter.DoubleToInt64Bits(a.V);

    private static ScalarLane FromBits(long bits) => new() { V = BitConverter.Int64BitsToDouble(bits) };
}
