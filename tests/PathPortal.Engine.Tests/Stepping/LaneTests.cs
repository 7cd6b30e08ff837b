using System.Runtime.CompilerServices;
using PathPortal.Engine.Stepping;

namespace PathPortal.Engine.Tests.Stepping;

/// <summary>Every lane operation gives the bits of the scalar one, at every width, for numbers of all kinds.</summary>
public sealed class LaneTests
{
    private static readonly double[] Special =
        [0, -0.0, 1, -1, double.NaN, double.PositiveInfinity, double.NegativeInfinity, double.Epsilon, double.MaxValue, 1e-310, 0.1, 1e9, 2e9];

    [Fact]
    public void Lane128_EveryOperation_GivesScalarBits() => Compare<Lane128>();

    [Fact]
    public void Lane256_EveryOperation_GivesScalarBits() => Compare<Lane256>();

    [Fact]
    public void Lane512_EveryOperation_GivesScalarBits() => Compare<Lane512>();

    private static void Compare<T>()
        where T : unmanaged, ILane<T>
    {
        var random = new Random(11);
        double Number() => random.Next(4) == 0 ? Special[random.Next(Special.Length)] : (random.NextDouble() - 0.5) * Math.Pow(10, random.Next(-8, 8));
        for (var round = 0; round < 3000; round++)
        {
            var a = Enumerable.Range(0, T.Width).Select(_ => Number()).ToArray();
            var b = Enumerable.Range(0, T.Width).Select(_ => Number()).ToArray();
            var c = Enumerable.Range(0, T.Width).Select(_ => Number()).ToArray();
            var wide = Operations(Lanes<T>(a), Lanes<T>(b), Lanes<T>(c)).Select(Numbers).ToArray();
            for (var lane = 0; lane < T.Width; lane++)
            {
                var narrow = Operations(Lanes<ScalarLane>([a[lane]]), Lanes<ScalarLane>([b[lane]]), Lanes<ScalarLane>([c[lane]]))
                    .Select(Numbers).ToArray();
                for (var i = 0; i < narrow.Length; i++)
                {
                    // A result that is not a number may carry either operand's payload; it never becomes a number again.
                    var (x, y) = (narrow[i][0], wide[i][lane]);
                    Assert.True(
                        BitConverter.DoubleToInt64Bits(x) == BitConverter.DoubleToInt64Bits(y) || (double.IsNaN(x) && double.IsNaN(y)),
                        $"seed 11, operation {i} of {a[lane]:R}, {b[lane]:R}, {c[lane]:R}: {x:R} scalar, {y:R} in {typeof(T).Name}");
                }
            }
        }
    }

    private static T[] Operations<T>(T a, T b, T c)
        where T : unmanaged, ILane<T>
    {
        LaneMath.SinCos(a, out var sin, out var cos);
        return
        [
            a + b, a - b, -a, a * b, a / b, T.PlusProduct(a, b, c), T.LessProduct(a, b, c), T.Sqrt(a), T.Abs(a), T.Min(a, b), T.Max(a, b),
            T.CopySign(a, b), a < b, a > b, a <= b, a >= b, a & b, a | b, ~a, T.Select(a < b, b, c), T.HasBit(a, 0), T.HasBit(a, 63), T.HasBit(a, 1),
            sin, cos, LaneMath.Atan2(a, b),
        ];
    }

    private static unsafe T Lanes<T>(double[] values)
        where T : unmanaged, ILane<T>
    {
        T lanes;
        values.CopyTo(new Span<double>(&lanes, T.Width));
        return lanes;
    }

    private static unsafe double[] Numbers<T>(T lanes)
        where T : unmanaged, ILane<T> => new Span<double>(Unsafe.AsPointer(ref lanes), T.Width).ToArray();
}
