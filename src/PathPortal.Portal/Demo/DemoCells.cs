using PathPortal.Engine.Control;
using PathPortal.Engine.Paths;
using PathPortal.Formats.Documents;

namespace PathPortal.Portal.Demo;

/// <summary>Parts of cell setups that the demo's cells share. Every number is invented.</summary>
public static class DemoCells
{
    /// <summary>A nozzle that leans 20° out of the flange axis.</summary>
    public static MeasuredPoseDocument Nozzle { get; } = Tool("nozzle", 20, 0, 150, 0, 20, 0);

    public static MeasuredPoseDocument Torch { get; } = Tool("torch", 0, 0, 120, 0, 0, 0);

    public static MeasuredPoseDocument Spindle { get; } = Tool("spindle", 60, 0, 180, 0, 45, 0);

    public static MeasuredPoseDocument Drill { get; } = Tool("drill", 0, 40, 240, 0, 30, 0);

    public static MeasuredPoseDocument Ball { get; } = Tool("ball 30", 0, 0, 200, 0, 0, 0);

    /// <summary>A base on a pedestal of that height, at the origin of the cell.</summary>
    public static MeasuredPoseDocument Pedestal(double heightMm) => new()
    {
        How = MeasuredHow.Surveyed,
        Detail = "invented: tracker, four points",
        Pose = new() { ZMm = heightMm },
    };

    /// <summary>The lower end of the track: the chain's first axis runs along the cell's x, the arm stands upright.</summary>
    public static MeasuredPoseDocument TrackEnd(double xMm, double yMm, double heightMm) => new()
    {
        How = MeasuredHow.Surveyed,
        Detail = "invented: tracker, both rail ends",
        Pose = new()
        {
            XMm = xMm,
            YMm = yMm,
            ZMm = heightMm,
            Orientation = new() { Convention = "moving_zyx", FirstDeg = 90, SecondDeg = 0, ThirdDeg = 90 },
        },
    };

    public static MeasuredPoseDocument Frame(string name, double xMm, double yMm, double zMm, double turnDeg = 0) => new()
    {
        Name = name,
        How = MeasuredHow.Surveyed,
        Detail = "invented: tracker on the fixture's bushings",
        Pose = new() { XMm = xMm, YMm = yMm, ZMm = zMm, Orientation = new() { ThirdDeg = turnDeg } },
    };

    /// <summary>A current controller: measured joints close the loop, short lag, damping only near singularities.</summary>
    public static ControllerDocument Current() => new()
    {
        ServoTimeConstantMs = 8,
        PositionGainPerS = 20,
        OrientationGainPerS = 20,
        TimeLaw = TimeLaw.Trapezoidal,
        ToolAccelerationMmS2 = 800,
        Damping = DampingKind.Variable,
        DampingLambda = 0.03,
        DampingEpsilon = 0.03,
    };

    /// <summary>An older controller: the loop closes on commanded joints and never sees the servo's long lag.</summary>
    public static ControllerDocument Older() => Current() with
    {
        ServoTimeConstantMs = 52,
        Feedback = FeedbackSource.Commanded,
    };

    private static MeasuredPoseDocument Tool(string name, double xMm, double yMm, double zMm, double rollDeg, double pitchDeg, double yawDeg) => new()
    {
        Name = name,
        How = MeasuredHow.Surveyed,
        Detail = "invented: measured on the tool stand",
        Pose = new()
        {
            XMm = xMm,
            YMm = yMm,
            ZMm = zMm,
            Orientation = new() { FirstDeg = rollDeg, SecondDeg = pitchDeg, ThirdDeg = yawDeg },
        },
    };
}
