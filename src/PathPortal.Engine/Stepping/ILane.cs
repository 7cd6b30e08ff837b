namespace PathPortal.Engine.Stepping;

/// <summary>
/// Several doubles that go through the same arithmetic side by side, one independent simulation each. Kernel code is written once over this
/// interface; a lane gives the same bits alone, in any company and at any width, because every operation here is rounded exactly as IEEE 754
/// asks (fused multiply-add, division and square root included) and none looks at another lane except <see cref="Any"/>.
/// </summary>
/// <remarks>
/// A comparison gives a mask: all bits of a lane set, or none. NaN compares false. Members are one operation deep, so that the compiler
/// inlines them into a kernel stage without a second level.
/// </remarks>
internal interface ILane<T>
    where T : unmanaged, ILane<T>
{
    /// <summary>How many doubles side by side.</summary>
    static abstract int Width { get; }

    /// <summary>The same number in every lane.</summary>
    static abstract T Of(double value);

    static abstract T operator +(T a, T b);

    static abstract T operator -(T a, T b);

    static abstract T operator -(T a);

    static abstract T operator *(T a, T b);

    static abstract T operator /(T a, T b);

    /// <summary>a b + c, rounded once.</summary>
    static abstract T PlusProduct(T a, T b, T c);

    /// <summary>c − a b, rounded once.</summary>
    static abstract T LessProduct(T a, T b, T c);

    static abstract T Sqrt(T a);

    static abstract T Abs(T a);

    /// <summary>a where a &lt; b, else b: b where either is NaN.</summary>
    static abstract T Min(T a, T b);

    /// <summary>a where a &gt; b, else b: b where either is NaN.</summary>
    static abstract T Max(T a, T b);

    /// <summary>Magnitude of the first, sign of the second.</summary>
    static abstract T CopySign(T magnitude, T sign);

    static abstract T operator <(T a, T b);

    static abstract T operator >(T a, T b);

    static abstract T operator <=(T a, T b);

    static abstract T operator >=(T a, T b);

    static abstract T operator &(T a, T b);

    static abstract T operator |(T a, T b);

    static abstract T operator ~(T a);

    /// <summary>Bits of a where the mask is set, of b elsewhere.</summary>
    static abstract T Select(T mask, T a, T b);

    /// <summary>Mask of the lanes whose bit <paramref name="bit"/> (0 the lowest) is set.</summary>
    static abstract T HasBit(T a, int bit);

    /// <summary>True when any lane of the mask is set.</summary>
    static abstract bool Any(T mask);
}
