using PathPortal.Engine.Arms;
using PathPortal.Engine.Control;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;
using PathPortal.Engine.Tests.Published;

namespace PathPortal.Engine.Tests.Control;

/// <summary>A straight line close beside the wrist singularity, with each kind of damping and a speed limit, against an independent implementation.</summary>
public sealed class WristPassTests
{
    // Published: relative to the value.
    private const double Relative = 1e-6;

    // Joint values at the end are given to ten digits, degrees; the loop there is as sensitive as the pass was close.
    private const double JointTolerance = 1e-6;

    public static TheoryData<string> Passes =>
    [
        "SING-close_pass-undamped", "SING-close_pass-const_lam0.05", "SING-close_pass-const_lam0.02", "SING-close_pass-var_lam0.05_eps0.10",
        "SING-close_pass-undamped_speed_limit_2rad_s_scaled", "SING-clear_pass-undamped", "SING-clear_pass-const_lam0.05",
        "SING-clear_pass-const_lam0.02", "SING-clear_pass-var_lam0.05_eps0.10", "SING-clear_pass-undamped_speed_limit_2rad_s_scaled",
    ];

    [Theory]
    [MemberData(nameof(Passes))]
    public void Run_BesideWristSingularity_MatchesIndependentLoop(string id)
    {
        var published = PublishedCase.Get(id);
        var source = published.Source;
        var samples = LoopScenarios.Run(Scenario(published));
        var count = 1001;
        Assert.True(samples.Count >= count);

        void Close(string name, double actual) => Approximately.Equal(
            published.ExpectedNumber(name), actual, Relative * published.ExpectedNumber(name), $"{source} {name}");
        Close("maxp", samples.TrackingError[..count].Max());
        Close("maxo", samples.TurnError[..count].Max());
        Close("minsig", samples.SigmaMin[..count].Min());
        Close("maxqd", samples.JointSpeeds.Max(j => j[..count].Max(Math.Abs)));
        Approximately.Equal(
            PublishedCase.Numbers(published.Expected.GetProperty("q_end_deg")),
            [.. samples.Joints.Select(j => j[count - 1] * 180 / Math.PI)],
            JointTolerance,
            source + " joints at the end (°)");
    }

    private static Scenario Scenario(PublishedCase published)
    {
        var start = LoopScenarios.Degrees(published.Input("q_start_deg"));
        var line = published.Input("line_m");
        var from = LoopScenarios.ToolPose(start, LoopScenarios.StraightTool).Translation;
        var way = new Vector3D(line[0], line[1], line[2]);
        var variant = published.Inputs.GetProperty("variant").GetString()!;
        var limited = variant.Contains("limit", StringComparison.Ordinal);
        var controller = LoopScenarios.Controller with
        {
            LimitsSpeed = limited,
            Damping = variant switch
            {
                "const_lam0.05" => Damping.Constant(0.05),
                "const_lam0.02" => Damping.Constant(0.02),
                "var_lam0.05_eps0.10" => Damping.Variable(0.05, 0.10),
                _ => Damping.None,
            },
        };

        // Four seconds rest to rest under the cubic law.
        var speed = 1.5 * way.Norm / published.InputNumber("duration");
        var scenario = LoopScenarios.Straight(start, LoopScenarios.StraightTool, [from, from + way], speed, TaskKind.Pose, controller);
        return limited
            ? scenario with { Arm = TestArms.SixJoints(new JointLimits { Speed = new(2, "the case") }) }
            : scenario;
    }
}
