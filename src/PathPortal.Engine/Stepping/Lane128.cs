using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;

namespace PathPortal.Engine.Stepping;

/// <summary>Two doubles in one register of 128 bits.</summary>
internal struct Lane128 : ILane<Lane128>
{
    internal Vector128<double> V;

    public static int Width => 2;

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane128 Of(double value) => new() { V = Vector128.Create(value) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane128 operator +(Lane128 a, Lane128 b) => new() { V = a.V + b.V };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane128 operator -(Lane128 a, Lane128 b) => new() { V = a.V - b.V };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane128 operator -(Lane128 a) => new() { V = -a.V };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane128 operator *(Lane128 a, Lane128 b) => new() { V = a.V * b.V };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane128 operator /(Lane128 a, Lane128 b) => new() { V = a.V / b.V };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane128 PlusProduct(Lane128 a, Lane128 b, Lane128 c) =>
        new() { V = Vector128.FusedMultiplyAdd(a.V, b.V, c.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane128 LessProduct(Lane128 a, Lane128 b, Lane128 c) =>
        new() { V = Vector128.FusedMultiplyAdd(-a.V, b.V, c.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane128 Sqrt(Lane128 a) => new() { V = Vector128.Sqrt(a.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane128 Abs(Lane128 a) => new() { V = Vector128.Abs(a.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane128 Min(Lane128 a, Lane128 b) =>
        new() { V = Vector128.ConditionalSelect(Vector128.LessThan(a.V, b.V), a.V, b.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane128 Max(Lane128 a, Lane128 b) =>
        new() { V = Vector128.ConditionalSelect(Vector128.GreaterThan(a.V, b.V), a.V, b.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane128 CopySign(Lane128 magnitude, Lane128 sign) =>
        new() { V = Vector128.ConditionalSelect(Vector128.Create(-0.0), sign.V, magnitude.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane128 operator <(Lane128 a, Lane128 b) => new() { V = Vector128.LessThan(a.V, b.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane128 operator >(Lane128 a, Lane128 b) => new() { V = Vector128.GreaterThan(a.V, b.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane128 operator <=(Lane128 a, Lane128 b) => new() { V = Vector128.LessThanOrEqual(a.V, b.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane128 operator >=(Lane128 a, Lane128 b) => new() { V = Vector128.GreaterThanOrEqual(a.V, b.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane128 operator &(Lane128 a, Lane128 b) => new() { V = a.V & b.V };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane128 operator |(Lane128 a, Lane128 b) => new() { V = a.V | b.V };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane128 operator ~(Lane128 a) => new() { V = ~a.V };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane128 Select(Lane128 mask, Lane128 a, Lane128 b) =>
        new() { V = Vector128.ConditionalSelect(mask.V, a.V, b.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane128 HasBit(Lane128 a, int bit) =>
        new() { V = Vector128.LessThan(Vector128.ShiftLeft(a.V.AsInt64(), 63 - bit), Vector128<long>.Zero).AsDouble() };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static bool Any(Lane128 mask) => mask.V.AsInt64() != Vector128<long>.Zero;
}
