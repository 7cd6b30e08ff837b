using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;

namespace PathPortal.Engine.Stepping;

/// <summary>Four doubles in one register of 256 bits.</summary>
internal struct Lane256 : ILane<Lane256>
{
    internal Vector256<double> V;

    public static int Width => 4;

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane256 Of(double value) => new() { V = Vector256.Create(value) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane256 operator +(Lane256 a, Lane256 b) => new() { V = a.V + b.V };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane256 operator -(Lane256 a, Lane256 b) => new() { V = a.V - b.V };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane256 operator -(Lane256 a) => new() { V = -a.V };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane256 operator *(Lane256 a, Lane256 b) => new() { V = a.V * b.V };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane256 operator /(Lane256 a, Lane256 b) => new() { V = a.V / b.V };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane256 PlusProduct(Lane256 a, Lane256 b, Lane256 c) =>
        new() { V = Vector256.FusedMultiplyAdd(a.V, b.V, c.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane256 LessProduct(Lane256 a, Lane256 b, Lane256 c) =>
        new() { V = Vector256.FusedMultiplyAdd(-a.V, b.V, c.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane256 Sqrt(Lane256 a) => new() { V = Vector256.Sqrt(a.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane256 Abs(Lane256 a) => new() { V = Vector256.Abs(a.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane256 Min(Lane256 a, Lane256 b) =>
        new() { V = Vector256.ConditionalSelect(Vector256.LessThan(a.V, b.V), a.V, b.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane256 Max(Lane256 a, Lane256 b) =>
        new() { V = Vector256.ConditionalSelect(Vector256.GreaterThan(a.V, b.V), a.V, b.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane256 CopySign(Lane256 magnitude, Lane256 sign) =>
        new() { V = Vector256.ConditionalSelect(Vector256.Create(-0.0), sign.V, magnitude.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane256 operator <(Lane256 a, Lane256 b) => new() { V = Vector256.LessThan(a.V, b.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane256 operator >(Lane256 a, Lane256 b) => new() { V = Vector256.GreaterThan(a.V, b.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane256 operator <=(Lane256 a, Lane256 b) => new() { V = Vector256.LessThanOrEqual(a.V, b.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane256 operator >=(Lane256 a, Lane256 b) => new() { V = Vector256.GreaterThanOrEqual(a.V, b.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane256 operator &(Lane256 a, Lane256 b) => new() { V = a.V & b.V };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane256 operator |(Lane256 a, Lane256 b) => new() { V = a.V | b.V };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane256 operator ~(Lane256 a) => new() { V = ~a.V };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane256 Select(Lane256 mask, Lane256 a, Lane256 b) =>
        new() { V = Vector256.ConditionalSelect(mask.V, a.V, b.V) };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lane256 HasBit(Lane256 a, int bit) =>
        new() { V = Vector256.LessThan(Vector256.ShiftLeft(a.V.AsInt64(), 63 - bit), Vector256<long>.Zero).AsDouble() };

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static bool Any(Lane256 mask) => mask.V.AsInt64() != Vector256<long>.Zero;
}
