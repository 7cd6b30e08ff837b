using PathPortal.Engine.Arms;
using PathPortal.Formats.Documents;

namespace PathPortal.Portal.Demo;

/// <summary>The arm models of the demo. Every number is invented; proportions are those of arms of that size, common practice, no source.</summary>
public static class DemoArms
{
    private const string Source = "invented for the demo";

    /// <summary>Six joints with a spherical wrist, 0.9 m reach.</summary>
    public static ArmDocument Bench() => new()
    {
        Name = "Bench arm 900",
        Note = "Invented. Six joints, spherical wrist, about 0.9 m reach.",
        CharacteristicLengthMm = 1000,
        Kinematics = ArmKinematics.DhStandard,
        Joints =
        [
            Row("J1 base", 50, 90, 400, Turn(-170, 170, 200, 900)),
            Row("J2 shoulder", 420, 0, 0, Turn(-30, 160, 180, 800)),
            Row("J3 elbow", 30, 90, 0, Turn(-110, 130, 200, 900)),
            Row("J4 forearm", 0, -90, 380, Turn(-190, 190, 100, 8000)),
            Row("J5 wrist", 0, 90, 0, Turn(-125, 125, 360, 8000)),
            Row("J6 flange", 0, 0, 90, Turn(-360, 360, 450, 8000)),
        ],
    };

    /// <summary>Six joints with a spherical wrist, 1.8 m reach.</summary>
    public static ArmDocument Floor() => new()
    {
        Name = "Floor arm 1800",
        Note = "Invented. Six joints, spherical wrist, about 1.8 m reach.",
        CharacteristicLengthMm = 1000,
        Kinematics = ArmKinematics.DhStandard,
        Joints = [.. LongArm(1)],
    };

    /// <summary>The long arm on a 4 m linear track: seven joints, one more than a pose needs.</summary>
    public static ArmDocument Track() => new()
    {
        Name = "Track arm 1800",
        Note = "Invented. The long arm on a linear track of 4 m: seven joints, one of them redundant.",
        CharacteristicLengthMm = 1000,
        Kinematics = ArmKinematics.DhStandard,
        Joints =
        [
            new JointDocument
            {
                Name = "J1 track",
                Kind = JointKind.Prismatic,
                AlphaDeg = -90,
                Limits = new()
                {
                    Low = Limit(0),
                    High = Limit(4000),
                    Speed = Limit(1500),
                    Acceleration = Limit(3000),
                },
            },
            .. LongArm(2),
        ],
    };

    private static IEnumerable<JointDocument> LongArm(int first) =>
    [
        Row($"J{first} base", 160, 90, 500, Turn(-175, 175, 150, 500)),
        Row($"J{first + 1} shoulder", 780, 0, 0, Turn(-25, 155, 140, 450)),
        Row($"J{first + 2} elbow", 100, 90, 0, Turn(-105, 140, 150, 500)),
        Row($"J{first + 3} forearm", 0, -90, 820, Turn(-270, 270, 260, 1200)),
        Row($"J{first + 4} wrist", 0, 90, 0, Turn(-120, 120, 260, 1200)),
        Row($"J{first + 5} flange", 0, 0, 110, Turn(-360, 360, 380, 2000)),
    ];

    private static JointDocument Row(string name, double aMm, double alphaDeg, double dMm, JointLimitsDocument limits) => new()
    {
        Name = name,
        AMm = aMm,
        AlphaDeg = alphaDeg,
        DMm = dMm,
        Limits = limits,
    };

    private static JointLimitsDocument Turn(double lowDeg, double highDeg, double speedDegS, double accelerationDegS2) => new()
    {
        Low = Limit(lowDeg),
        High = Limit(highDeg),
        Speed = Limit(speedDegS),
        Acceleration = Limit(accelerationDegS2),
    };

    private static LimitDocument Limit(double value) => new() { Value = value, Source = Source };
}
