using System.Collections.Immutable;
using System.Globalization;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;

namespace PathPortal.Engine.Postures;

/// <summary>The start postures of a scenario, in a fixed order.</summary>
/// <param name="Starts">Every one to simulate; at most <see cref="Most"/>.</param>
/// <param name="Reason">Why there is none, in a sentence; null when there is one.</param>
/// <param name="LeftOut">How many more there were; those kept are the furthest from their position limits.</param>
public sealed record StartPostures(ImmutableArray<StartPosture> Starts, string? Reason, int LeftOut)
{
    /// <summary>More starts than this say nothing new: they are turns and grid points of the same few branches.</summary>
    public const int Most = 96;

    /// <summary>Step of the grid over a free turn (15°), in rad.</summary>
    public const double FreeTurnStep = Math.PI / 12;

    /// <summary>
    /// The given start, or else every posture of the first waypoint inside the position limits. Where the first straight move leaves the turn about
    /// the tool axis free and none is given, a grid of 15° over that turn. Where it constrains the tool point alone, the programmed orientation, or
    /// any where that can't be reached.
    /// </summary>
    public static StartPostures Find(Scenario scenario)
    {
        ArgumentNullException.ThrowIfNull(scenario);
        if (scenario.Start is { } given)
        {
            return new([new(given, "as given", scenario.FreeTurn ?? 0)], null, 0);
        }

        var finder = new PostureFinder(scenario.Arm, scenario.Cell.ToolInFlange);
        var first = scenario.Path.Waypoints[0];
        var X_BW = scenario.Cell.BaseInCell.Inverse() * scenario.Cell.WorkInCell;
        var X_BT = X_BW * new RigidTransform(RotationMatrix.FromQuaternion(first.Orientation), first.Position);
        var task = FirstTask(scenario.Path);
        var n = scenario.Arm.Joints.Length;

        var found = new Collected();
        if (task == TaskKind.Axis && n == 5)
        {
            found.Add(finder.All(X_BT, TaskKind.Axis), scenario.FreeTurn ?? 0, "");
        }
        else if (task == TaskKind.Axis && scenario.FreeTurn is null)
        {
            for (var k = 0; k < 24; k++)
            {
                var turn = JointTurns.Wrap(k * FreeTurnStep);
                var words = string.Create(CultureInfo.InvariantCulture, $", tool turned {15 * (k <= 12 ? k : k - 24)}°");
                found.Add(finder.All(Turned(X_BT, turn)), turn, k == 0 ? "" : words);
            }
        }
        else
        {
            var turn = scenario.FreeTurn ?? 0;
            found.Add(finder.All(Turned(X_BT, turn)), turn, "");
            if (task == TaskKind.Point && found.Inside.Count == 0)
            {
                found.Add(finder.All(X_BT, TaskKind.Point), turn, ", orientation free");
            }
        }

        return found.Conclude(scenario.Arm, finder.ClosedForm);
    }

    private static TaskKind FirstTask(ToolPath path) =>
        path.Waypoints.Length > 1 && path.Waypoints[1].Motion == MotionKind.Straight ? path.Waypoints[1].Task : TaskKind.Pose;

    private static RigidTransform Turned(RigidTransform X_BT, double turn) => turn == 0
        ? X_BT
        : X_BT * new RigidTransform(RotationMatrix.AboutZ(Angle.FromRadians(turn)), Vector3D.Zero);

    private sealed class Collected
    {
        public List<StartPosture> Inside { get; } = [];

        private readonly List<ImmutableArray<double>> outside = [];

        public void Add(PostureSet set, double freeTurn, string words)
        {
            Inside.AddRange(set.Inside.Select(p => new StartPosture(p.Joints, p.Description + words, freeTurn)));
            outside.AddRange(set.Outside.Select(p => p.Joints));
        }

        public StartPostures Conclude(ArmModel arm, bool closedForm)
        {
            if (Inside.Count == 0)
            {
                return new([], Why(arm, closedForm), 0);
            }

            // Kept by room to the limits, then put back in the order found.
            var kept = Inside.Index().OrderByDescending(s => JointRoom.Smallest(arm, s.Item.Joints)).ThenBy(s => s.Index)
                .Take(Most).OrderBy(s => s.Index).Select(s => s.Item);
            return new([.. kept], null, Math.Max(0, Inside.Count - Most));
        }

        private string Why(ArmModel arm, bool closedForm)
        {
            if (outside.Count == 0)
            {
                return closedForm
                    ? "The first waypoint is out of the arm's reach."
                    : "No posture was found that reaches the first waypoint.";
            }

            var nearest = outside.MaxBy(joints => JointRoom.Smallest(arm, joints));
            return "The first waypoint can be reached only beyond joint limits: " + JointRoom.Describe(arm, nearest) + ".";
        }
    }
}
