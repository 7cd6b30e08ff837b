using System.Collections.Immutable;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Geometry;

namespace PathPortal.TestSupport.Runs;

/// <summary>An arm of six turning joints with a spherical wrist, and a cell around it. Every number is invented.</summary>
public static class InventedArm
{
    private const string Source = "invented";

    /// <summary>The pose of the cell's part, seen from the base: in front of the arm, at table height.</summary>
    public static CellGeometry Cell { get; } = new(
        RigidTransform.FromTranslation(0, 0, 0.35), RigidTransform.FromTranslation(0, 0, 0.18), RigidTransform.FromTranslation(0.9, -0.35, 0.5));

    public static ArmModel Model { get; } = new()
    {
        Name = "Heron 12",
        CharacteristicLength = 1,
        FlangeInLastJoint = RigidTransform.FromTranslation(0, 0, 0.1),
        Joints =
        [
            Joint("J1", RigidTransform.FromTranslation(0, 0, 0.2), 170, 165, 500),
            Joint("J2", new(TurnedAboutX, new(0.15, 0, 0.25)), 120, 165, 500),
            Joint("J3", RigidTransform.FromTranslation(0.6, 0, 0), 150, 190, 600),
            Joint("J4", new(TurnedAboutY, new(0.1, 0, 0)), 185, 290, 900),
            Joint("J5", new(TurnedAboutX, new(0, 0, 0.62)), 140, 290, 1100),
            Joint("J6", new(TurnedBack, new(0, 0, 0)), 350, 420, 1200),
        ],
    };

    // z of the next joint along −y, +x, and back again.
    private static RotationMatrix TurnedAboutX => new(1, 0, 0, 0, 0, -1, 0, 1, 0);

    private static RotationMatrix TurnedAboutY => new(0, 0, 1, 0, -1, 0, 1, 0, 0);

    private static RotationMatrix TurnedBack => new(1, 0, 0, 0, 0, 1, 0, -1, 0);

    /// <summary>The tool in the work frame.</summary>
    public static RigidTransform ToolInWork(ReadOnlySpan<double> joints)
    {
        var x = Cell.BaseInCell;
        for (var j = 0; j < Model.Joints.Length; j++)
        {
            var (s, c) = Math.SinCos(joints[j]);
            x = x * Model.Joints[j].PoseInPrevious * new RigidTransform(new(c, -s, 0, s, c, 0, 0, 0, 1), Vector3D.Zero);
        }
        return Cell.WorkInCell.Inverse() * x * Model.FlangeInLastJoint * Cell.ToolInFlange;
    }

    private static Joint Joint(string name, RigidTransform pose, double range, double speed, double acceleration) => new(
        name, JointKind.Revolute, pose, 1, 0, new()
        {
            Low = new(-Radians(range), Source),
            High = new(Radians(range), Source),
            Speed = new(Radians(speed), Source),
            Acceleration = new(Radians(acceleration), Source),
        });

    private static double Radians(double degrees) => degrees * Math.PI / 180;
}
