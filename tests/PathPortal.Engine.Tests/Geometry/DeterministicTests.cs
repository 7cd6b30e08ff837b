using PathPortal.Engine.Geometry;

namespace PathPortal.Engine.Tests.Geometry;

/// <summary>
/// Expected values: series summed with 70 decimal digits in exact decimal arithmetic, then rounded to double; an independent route with no
/// platform library in it.
/// </summary>
public sealed class DeterministicTests
{
    // Units in the last place of the result. The functions are made for 1.5; half a unit is what any double costs.
    private const double Ulps = 1.5;

    public static TheoryData<double, double, double> Angles => new()
    {
        { 0.0, 0.0, 1.0 },
        { 1e-09, 1e-09, 1.0 },
        { 0.1, 0.09983341664682815, 0.9950041652780258 },
        { 0.5, 0.479425538604203, 0.8775825618903728 },
        { 0.7853981633974483, 0.7071067811865475, 0.7071067811865476 },
        { 1.0, 0.8414709848078965, 0.5403023058681398 },
        { 1.5707963267948966, 1.0, 6.123233995736766e-17 },
        { 2.0, 0.9092974268256817, -0.4161468365471424 },
        { 3.141592653589793, 1.2246467991473532e-16, -1.0 },
        { -3.0, -0.1411200080598672, -0.9899924966004454 },
        { 4.5, -0.977530117665097, -0.2107957994307797 },
        { 6.283185307179586, -2.4492935982947064e-16, 1.0 },
        { -10.0, 0.5440211108893698, -0.8390715290764524 },
        { 22.0, -0.008851309290403876, -0.9999608263946371 },
        { 100.0, -0.5063656411097588, 0.8623188722876839 },
        { 355.0, -3.014435335948845e-05, -0.999999999545659 },
        { -1000.0, -0.8268795405320025, 0.5623790762907029 },
        { 123456.789, -0.9986640823432246, 0.05167253271870138 },
        { 1000000.0, -0.34999350217129294, 0.9367521275331447 },
        { 1000000000.0, 0.5458434494486996, 0.8378871813639024 },
        { 5.6789554664432895, -0.5681284500323499, 0.8229398910393393 },
        { 2.6075581983738356, 0.5090101740134367, -0.8607605025503964 },
        { 3.7311295890770193, -0.5559761841359272, -0.8311982210481766 },
        { 5.66462732938583, -0.5798609260260624, 0.8147154757755601 },
        { -3.3624157351543236, 0.21903279226831893, -0.9757174980039783 },
        { 1.9001621744838495, 0.9462476459248916, -0.32344302833976935 },
        { 5.669239725330703, -0.5760969809666869, 0.8173813482830818 },
        { 5.209825236975949, -0.878808800531399, 0.4771740689817121 },
        { 1.0211693694891046, 0.8527194473880731, 0.5223691645246483 },
        { -4.628706780242021, 0.9965006874609266, -0.08358456729505041 },
        { -1.2386771314266065, -0.945353509225399, 0.3260471478102877 },
        { 6.913732178882615, 0.5895865572024439, 0.8077052009032561 },
    };

    public static TheoryData<double, double, double> Points => new()
    {
        { 1.0, 1.0, 0.7853981633974483 },
        { 1.0, 0.0, 1.5707963267948966 },
        { -1.0, 0.0, -1.5707963267948966 },
        { 1e-12, 1.0, 1e-12 },
        { 0.41421356237309503, 1.0, 0.39269908169872414 },
        { 0.5, 1.0, 0.4636476090008061 },
        { 1.0, 0.5, 1.1071487177940904 },
        { 1.0, -0.3, 1.8622531212727638 },
        { -1.0, -2.0, -2.677945044588987 },
        { 0.1, -5.0, 3.1215953196166426 },
        { -1e-09, -1.0, -3.141592652589793 },
        { -0.7935044001776401, -0.36172170230142053, -1.9985072924422804 },
        { 0.9000782159070004, -0.10119848829534916, 1.6827591197866154 },
        { -0.5826948553351141, -0.366192033508814, -2.1318695599817072 },
        { 0.8172716897922254, -0.32886237906305227, 1.9533617955164697 },
        { -0.14525641362779917, 0.2553676741994857, -0.5171720381824041 },
        { 0.6111701405293295, -0.015772828386232396, 1.5965981894917585 },
        { -0.8370680331238614, 0.14641988639000614, -1.3976283467524546 },
        { -0.9298056930032947, -0.810950054470428, -2.2880221141918335 },
        { -0.6193249187853502, 0.3868764454786515, -1.0124311578269447 },
        { -0.43305515788401006, 0.3804996200916597, -0.8499084022235992 },
        { -0.6733011063343728, -0.7646062239156999, -2.4196079629350784 },
        { -0.9533105452723303, 0.41156742325365014, -1.1632438668879084 },
        { 0.7182252830440667, -0.5606687728474871, 2.233614687829959 },
        { -0.5248612604139375, -0.9740398258109577, -2.6473502660590653 },
    };

    public static TheoryData<double, double> Exponentials => new()
    {
        { 0.0, 1.0 },
        { -0.2, 0.8187307530779818 },
        { 1.0, 2.718281828459045 },
        { -1.0, 0.36787944117144233 },
        { 10.0, 22026.465794806718 },
        { -50.0, 1.9287498479639178e-22 },
        { 700.0, 1.0142320547350045e+304 },
        { -700.0, 9.85967654375977e-305 },
        { 0.34657359027997264, 1.414213562373095 },
        { 1e-10, 1.0000000001 },
        { 1.448584468489341, 4.257084211288554 },
        { -1.9925392210932014, 0.13634876584683248 },
        { -3.63127695807963, 0.026482345962709052 },
        { 1.4687355857981625, 4.343739381573617 },
        { 0.9973355175028189, 2.7110486547164347 },
        { -0.5261144856732596, 0.5908964516308922 },
    };

    public static TheoryData<double, double> Logarithms => new()
    {
        { 1.0, 0.0 },
        { 2.0, 0.6931471805599453 },
        { 0.5, -0.6931471805599453 },
        { 1.0000001, 9.999999505838704e-08 },
        { 0.9999, -0.00010000500033334732 },
        { 1e-300, -690.7755278982137 },
        { 1e+300, 690.7755278982137 },
        { 3.7, 1.308332819650179 },
        { 0.7650664419841108, -0.2677925966602295 },
        { 3.1933533129767557, 1.161071559968392 },
        { 2.7784465563597207, 1.0218919788433733 },
        { 2.164505092677851, 0.7721917407166502 },
        { 0.8233579399352975, -0.19436425191372816 },
        { 4.644171100360396, 1.5356129064731388 },
    };

    public static TheoryData<double, double> InverseHyperbolicSines => new()
    {
        { 0.0, 0.0 },
        { 1e-08, 1e-08 },
        { 0.1, 0.09983407889920756 },
        { -0.17, -0.1691916359351954 },
        { 0.5, 0.48121182505960347 },
        { 1.0, 0.881373587019543 },
        { -20.0, -3.6895038689889055 },
        { 1000000.0, 14.50865773852447 },
    };

    [Theory]
    [MemberData(nameof(Angles))]
    public void SinCos_KnownAngle_IsRightToTheLastPlace(double angle, double sin, double cos)
    {
        var (s, c) = Deterministic.SinCos(angle);
        AssertClose(sin, s);
        AssertClose(cos, c);
    }

    [Theory]
    [MemberData(nameof(Points))]
    public void Atan2_KnownPoint_IsRightToTheLastPlace(double y, double x, double angle) => AssertClose(angle, Deterministic.Atan2(y, x));

    [Theory]
    [MemberData(nameof(Exponentials))]
    public void Exp_KnownValue_IsRightToTheLastPlace(double x, double expected) => AssertClose(expected, Deterministic.Exp(x));

    [Theory]
    [MemberData(nameof(Logarithms))]
    public void Log_KnownValue_IsRightToTheLastPlace(double x, double expected) => AssertClose(expected, Deterministic.Log(x), 2.5);

    [Theory]
    [MemberData(nameof(InverseHyperbolicSines))]
    public void Asinh_KnownValue_IsRightToTheLastPlace(double x, double expected) => AssertClose(expected, Deterministic.Asinh(x), 4);

    [Fact]
    public void SinCos_NotFiniteOrHuge_IsNotANumber()
    {
        foreach (var angle in new[] { double.NaN, double.PositiveInfinity, double.NegativeInfinity, 1e10 })
        {
            var (sin, cos) = Deterministic.SinCos(angle);
            Assert.True(double.IsNaN(sin) && double.IsNaN(cos), $"{angle} gave {sin}, {cos}.");
        }
    }

    [Fact]
    public void Atan2_NotANumber_IsNotANumber()
    {
        Assert.True(double.IsNaN(Deterministic.Atan2(double.NaN, 1)));
        Assert.True(double.IsNaN(Deterministic.Atan2(1, double.NaN)));
        Assert.True(double.IsNaN(Deterministic.Acos(1.5)));
    }

    [Fact]
    public void Atan2_Zeros_GoBySign()
    {
        Assert.Equal(0.0, Deterministic.Atan2(0, 0));
        Assert.Equal(Math.PI, Deterministic.Atan2(0, -0.0));
        Assert.Equal(Math.PI, Deterministic.Atan2(0, -1));
        Assert.Equal(-Math.PI, Deterministic.Atan2(-0.0, -1));
    }

    [Fact]
    public void Exp_BeyondRange_IsZeroOrInfinite()
    {
        Assert.Equal(0, Deterministic.Exp(-800));
        Assert.Equal(double.PositiveInfinity, Deterministic.Exp(800));
        Assert.True(double.IsNaN(Deterministic.Exp(double.NaN)));
    }

    [Fact]
    public void Acos_RandomCosines_UndoesCos()
    {
        // Between 0.01 and 3.13 rad cos falls steeply enough that rounding it costs the angle at most 1e-14 rad.
        var random = new Random(71);
        for (var i = 0; i < 1000; i++)
        {
            var angle = 0.01 + 3.12 * random.NextDouble();
            var back = Deterministic.Acos(Deterministic.Cos(angle));
            Assert.True(Math.Abs(back - angle) < 3e-14, $"seed 71, case {i}: {angle} came back as {back}.");
        }
    }

    private static void AssertClose(double expected, double actual, double ulps = Ulps)
    {
        var allowed = ulps * Math.Max(Math.BitIncrement(Math.Abs(expected)) - Math.Abs(expected), double.Epsilon);
        Assert.True(Math.Abs(actual - expected) <= allowed, $"Expected {expected:R}, got {actual:R}, allowed difference {allowed:R}.");
    }
}
