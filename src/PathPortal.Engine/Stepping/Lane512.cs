using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;

namespace PathPortal.Engine.Stepping;

/// <summary>Eight doubles in one register of 512 bits.</summary>
internal struct Lane512 : ILane<Lane512>
{
    internal Vector512<double> V;

    public static int Width => 8;

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane512 Of(double value) => new() { V = Vector512.Create(value) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane512 operator +(Lane512 a, Lane512 b) => new() { V = a.V + b.V };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane512 operator -(Lane512 a, Lane512 b) => new() { V = a.V - b.V };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane512 operator -(Lane512 a) => new() { V = -a.V };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane512 operator *(Lane512 a, Lane512 b) => new() { V = a.V * b.V };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane512 operator /(Lane512 a, Lane512 b) => new() { V = a.V / b.V };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane512 PlusProduct(Lane512 a, Lane512 b, Lane512 c) =>
        new() { V = Vector512.FusedMultiplyAdd(a.V, b.V, c.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane512 LessProduct(Lane512 a, Lane512 b, Lane512 c) =>
        new() { V = Vector512.FusedMultiplyAdd(-a.V, b.V, c.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane512 Sqrt(Lane512 a) => new() { V = Vector512.Sqrt(a.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane512 Abs(Lane512 a) => new() { V = Vector512.Abs(a.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane512 Min(Lane512 a, Lane512 b) =>
        new() { V = Vector512.ConditionalSelect(Vector512.LessThan(a.V, b.V), a.V, b.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane512 Max(Lane512 a, Lane512 b) =>
        new() { V = Vector512.ConditionalSelect(Vector512.GreaterThan(a.V, b.V), a.V, b.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane512 CopySign(Lane512 magnitude, Lane512 sign) =>
        new() { V = Vector512.ConditionalSelect(Vector512.Create(-0.0), sign.V, magnitude.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane512 operator <(Lane512 a, Lane512 b) => new() { V = Vector512.LessThan(a.V, b.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane512 operator >(Lane512 a, Lane512 b) => new() { V = Vector512.GreaterThan(a.V, b.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane512 operator <=(Lane512 a, Lane512 b) => new() { V = Vector512.LessThanOrEqual(a.V, b.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane512 operator >=(Lane512 a, Lane512 b) => new() { V = Vector512.GreaterThanOrEqual(a.V, b.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane512 operator &(Lane512 a, Lane512 b) => new() { V = a.V & b.V };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane512 operator |(Lane512 a, Lane512 b) => new() { V = a.V | b.V };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane512 operator ~(Lane512 a) => new() { V = ~a.V };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane512 Select(Lane512 mask, Lane512 a, Lane512 b) =>
        new() { V = Vector512.ConditionalSelect(mask.V, a.V, b.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane512 HasBit(Lane512 a, int bit) =>
        new() { V = Vector512.LessThan(Vector512.ShiftLeft(a.V.AsInt64(), 63 - bit), Vector512<long>.Zero).AsDouble() };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static bool Any(Lane512 mask) => mask.V.AsInt64() != Vector512<long>.Zero;
}
